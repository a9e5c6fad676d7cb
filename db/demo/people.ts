import type { CourseRole } from '@/shared/api/fields'

/** Who may be signed in as in the demo, and with which password. */
export type DemoPeople = Readonly<{
  password: string
  people: readonly Readonly<{ name: string; email: string; role: string }>[]
}>

/** Of everybody in the demo; printed when it starts. */
export const DEMO_PASSWORD = 'linden-row-1725'

export type DemoPerson = Readonly<{
  name: string
  email: string
  role: CourseRole | 'administrator'
  /** What the demo's list of people says beside the role. */
  note?: string
}>

const at = (box: string) => `${box}@linden-row.example`
const student = (name: string, box: string, note?: string): DemoPerson => ({
  name,
  email: at(box),
  role: 'student',
  ...(note !== undefined && { note }),
})

/** The people of the Linden Row School of Music. All are invented. */
export const DEMO_PEOPLE: readonly DemoPerson[] = [
  { name: 'Ilse Marrow', email: at('ilse.marrow'), role: 'teacher' },
  { name: 'Teo Brandt', email: at('teo.brandt'), role: 'assistant' },
  { name: 'Nadia Quill', email: at('nadia.quill'), role: 'administrator' },
  student('Zoë Ashdown', 'zoe.ashdown'),
  student('Jiří Novotný', 'jiri.novotny'),
  student('Amélie Beaufort', 'amelie.beaufort'),
  student('Łukasz Zieliński', 'lukasz.zielinski'),
  student('Søren Østby', 'soren.ostby'),
  student('Inés Peñalver', 'ines.penalver'),
  student('Müge Yıldırım', 'muge.yildirim'),
  student('Oyelaran Adébáyọ̀', 'oyelaran.adebayo'),
  student('Nguyễn Thị Hồng', 'hong.nguyen'),
  student('Ελένη Παππά', 'eleni.pappa'),
  student('Марія Ковальчук', 'mariya.kovalchuk'),
  student('佐伯 澪', 'mio.saeki'),
  student('נועה לביא', 'noa.lavi'),
  student('Gwenllïan Prŷs', 'gwenllian.prys', 'uses a screen reader'),
  student('Maximiliana Theodora von Hohenfels-Wittgenau zu Altenbruck', 'maximiliana', 'a very long name'),
  student('Þórdís Ævarsdóttir', 'thordis.aevarsdottir'),
  student('João Falcão', 'joao.falcao'),
  student('Siobhán Ní Bhraonáin', 'siobhan.nibhraonain'),
]

export const demoPeople: DemoPeople = {
  password: DEMO_PASSWORD,
  people: DEMO_PEOPLE.map(({ name, email, role, note }) => ({
    name,
    email,
    role: note === undefined ? role : `${role}, ${note}`,
  })),
}
