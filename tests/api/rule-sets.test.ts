import { api } from '@/shared/api'
import {
  createRuleSetFile,
  RULE_SET_SCHEMA_PATH,
  settingsOf,
  type RuleSettings,
} from '@/shared/rule-sets/rule-set-file'
import { findPreset, RULES, type RuleSet } from '@/shared/rules'
import { errorOf, type TestBrowser } from '@/tests/support/test-browser'
import { insertCourseWith, insertPerson, signedIn, type TestPerson } from '@/tests/support/test-people'
import { startTestServer, type TestServer } from '@/tests/support/test-server'

let server: TestServer
let teacher: TestPerson
let leader: TestBrowser
const db = () => server.database.db

beforeAll(async () => {
  server = await startTestServer()
  teacher = await insertPerson(db(), 'Ilse Marrow', { mayMakeCourses: true })
  leader = await signedIn(server, teacher)
})
afterAll(() => server.close())

const starter = findPreset('starter') as RuleSet
const body = { name: 'This term', basedOn: 'starter', rules: settingsOf(starter.rules) }

describe('rule sets', () => {
  it('are kept, changed, listed without their rules, and given up', async () => {
    const { ruleSet } = await leader.get(api.ruleSets.create, { body })
    expect(ruleSet).toMatchObject({ ...body, isMine: true, courseId: null })
    const params = { ruleSetId: ruleSet.id }
    const rules: RuleSettings = { ...body.rules, 'par-perfect': { level: 'off' } }
    await leader.get(api.ruleSets.update, { params, body: { ...body, name: 'Next term', rules } })
    const kept = (await leader.get(api.ruleSets.get, { params })).ruleSet
    expect(kept.name).toBe('Next term')
    expect(kept.rules).toEqual(rules)
    const laws = Object.values(rules).filter(({ level }) => level === 'law').length
    const { ruleSets } = await leader.get(api.ruleSets.list)
    expect(ruleSets.find(({ id }) => id === ruleSet.id)).toMatchObject({ name: 'Next term', laws })
    await leader.get(api.ruleSets.remove, { params })
    expect((await leader.ask(api.ruleSets.get, { params })).status).toBe(404)
  })

  it('shared with a course are for those who teach in it, and theirs to copy, not to change', async () => {
    const assistant = await insertPerson(db(), 'Teo Brandt')
    const courseId = await insertCourseWith(db(), 'Shared', {
      [teacher.id]: 'teacher',
      [assistant.id]: 'assistant',
    })
    const helper = await signedIn(server, assistant)
    const { ruleSet } = await leader.get(api.ruleSets.create, { body: { ...body, courseId } })
    const params = { ruleSetId: ruleSet.id }
    const seen = (await helper.get(api.ruleSets.get, { params })).ruleSet
    expect(seen).toMatchObject({ name: body.name, isMine: false, courseId })
    expect((await helper.ask(api.ruleSets.update, { params, body })).status).toBe(403)
    const { name, basedOn, rules } = seen
    const { ruleSet: copy } = await helper.get(api.ruleSets.create, { body: { name, basedOn, rules } })
    expect(copy).toMatchObject({ isMine: true, courseId: null, rules })
    await leader.get(api.ruleSets.update, { params, body: { ...body, courseId: null } })
    expect((await helper.ask(api.ruleSets.get, { params })).status).toBe(404)
  })

  it('go out as a file and come in again the same', async () => {
    const file = createRuleSetFile(body, 'https://board.school.example')
    const { ruleSet } = await leader.get(api.ruleSets.import, {
      body: JSON.parse(JSON.stringify(file)) as typeof file,
    })
    expect(ruleSet).toMatchObject({ ...body, isMine: true, courseId: null })
  })

  it.each([
    ['without a name', { name: ' ' }, { path: 'name', code: 'empty' }],
    ['with a name too long', { name: 'x'.repeat(81) }, { path: 'name', code: 'too-long' }],
    ['with hidden characters', { name: 'a\u202eb' }, { path: 'name', code: 'hidden-characters' }],
    ['from no preset', { basedOn: 'nothing' }, { path: 'basedOn', code: 'not-an-option' }],
    [
      'with a rule nobody knows',
      { rules: { 'no-such-rule': { level: 'law' } } },
      { path: 'rules.no-such-rule', code: 'unknown-rule' },
    ],
    [
      'with a parameter out of range',
      { rules: { 'dist-max': { level: 'law', params: { max: 0 } } } },
      { path: 'rules.dist-max.params.max', code: 'bad-params' },
    ],
    [
      'with a parameter the rule has not, though it is off',
      { rules: { 'dist-max': { level: 'off', params: { width: 3 } } } },
      { path: 'rules.dist-max.params', code: 'bad-params' },
    ],
    [
      'at no level',
      { rules: { 'dist-max': { level: 'always' } } },
      { path: 'rules.dist-max.level', code: 'not-an-option' },
    ],
    [
      'of too many rules',
      { rules: Object.fromEntries(Array.from({ length: 401 }, (_, n) => [`rule-${n}`, { level: 'off' }])) },
      { path: 'rules', code: 'too-long' },
    ],
    ['with something beside', { ownerId: 'me' }, { path: 'ownerId', code: 'unknown-key' }],
    [
      'for a course that is another’s',
      { courseId: 'abcdefgh1234' },
      { path: 'courseId', code: 'not-an-option' },
    ],
  ])('are refused %s, and the field is told', async (_what, change, problem) => {
    const answer = await leader.ask(api.ruleSets.create, { body: { ...body, ...change } })
    expect(answer.status).toBe(422)
    expect(errorOf(answer).fields?.[0]).toMatchObject(problem)
  })

  it('are refused as a file of a later form', async () => {
    const answer = await leader.ask(api.ruleSets.import, { body: { version: 2, ...body } })
    expect(answer.status).toBe(422)
    expect(errorOf(answer).fields?.[0]).toMatchObject({ path: 'version' })
  })

  it('have a published schema that names every rule of the catalogue, for anybody', async () => {
    const response = await fetch(`${server.url}${RULE_SET_SCHEMA_PATH}`)
    expect(response.status).toBe(200)
    const schema = (await response.json()) as { properties: { rules: { properties: object } } }
    expect(Object.keys(schema.properties.rules.properties)).toEqual(RULES.map(({ id }) => id))
  })
})
