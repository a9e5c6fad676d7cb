import type { BrowserContext } from 'playwright-core'
import { cantus } from '@/shared/api/cantus'
import { courses } from '@/shared/api/courses'
import { lessons } from '@/shared/api/lessons'
import { ruleSets } from '@/shared/api/rule-sets'
import { settingsOf } from '@/shared/rule-sets/rule-set-file'
import { findPreset } from '@/shared/rules'
import { ask } from './ask'

/** Every screen of the product, with whose eyes it is looked at. `null`: nobody is signed in. */
export type Screen = Readonly<{
  name: string
  who: 'teacher' | 'student' | 'administrator' | 'wall' | null
  path: string
}>

/** Addresses of all screens, in a school where `lessonId` is an open lesson of the teacher's course. */
export async function listScreens(
  teacher: BrowserContext,
  origin: string,
  lessonId: string,
): Promise<readonly Screen[]> {
  const { courses: own } = await ask(teacher.request, origin, courses.list)
  const courseId = own.find(({ myRole }) => myRole === 'teacher')?.id ?? ''
  const { cantus: library } = await ask(teacher.request, origin, cantus.list)
  const starter = findPreset('starter')?.rules ?? {}
  const { ruleSet } = await ask(teacher.request, origin, ruleSets.create, {
    body: {
      name: 'The first term',
      basedOn: 'starter',
      rules: settingsOf({ ...starter, 'voice-overlap': { level: 'law' } }),
    },
  })
  const link = await ask(teacher.request, origin, courses.createLink, {
    params: { courseId },
    body: { role: 'student' },
  })
  const wall = await ask(teacher.request, origin, lessons.createWallLink, { params: { lessonId } })
  const pathOf = (url: string | null): string => new URL(url ?? '/', origin).pathname
  return [
    { name: 'landing', who: null, path: '/' },
    { name: 'join', who: null, path: '/join' },
    { name: 'sign-in', who: null, path: '/sign-in' },
    { name: 'sign-up', who: null, path: '/sign-up' },
    { name: 'forgot', who: null, path: '/forgot' },
    { name: 'reset', who: null, path: '/reset?token=spent' },
    { name: 'verify', who: null, path: '/verify?token=spent' },
    { name: 'invitation', who: null, path: pathOf(link.invitation.url) },
    { name: 'not-found', who: null, path: '/no/such/page' },
    { name: 'home', who: 'teacher', path: '/home' },
    { name: 'account', who: 'teacher', path: '/account' },
    { name: 'course', who: 'teacher', path: `/courses/${courseId}` },
    { name: 'members', who: 'teacher', path: `/courses/${courseId}/members` },
    { name: 'new-lesson', who: 'teacher', path: `/courses/${courseId}/new-lesson` },
    { name: 'cantus-library', who: 'teacher', path: '/cantus' },
    { name: 'cantus-new', who: 'teacher', path: '/cantus/new' },
    { name: 'cantus', who: 'teacher', path: `/cantus/${library[0]?.id}` },
    { name: 'rules', who: null, path: '/rules' },
    { name: 'rule', who: null, path: '/rules/dir-perfect' },
    { name: 'rule-unknown', who: null, path: '/rules/no-such-rule' },
    { name: 'rule-sets', who: 'teacher', path: '/rule-sets' },
    { name: 'rule-set', who: 'teacher', path: `/rule-sets/${ruleSet.id}` },
    { name: 'rule-set-offered', who: 'teacher', path: '/rule-sets/fux-mann' },
    { name: 'rule-set-new', who: 'teacher', path: '/rule-sets/new?from=starter' },
    { name: 'rule-sets-compared', who: 'teacher', path: `/rule-sets/compare?a=${ruleSet.id}&b=starter` },
    { name: 'lectern', who: 'teacher', path: `/lessons/${lessonId}/lectern` },
    { name: 'desk', who: 'student', path: `/lessons/${lessonId}/desk` },
    { name: 'refused', who: 'student', path: `/lessons/${lessonId}/lectern` },
    { name: 'wall', who: 'wall', path: pathOf(wall.url) },
    { name: 'people', who: 'administrator', path: '/people' },
    { name: 'demo-mail', who: null, path: '/demo/mail' },
  ]
}
