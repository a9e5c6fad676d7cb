import { networkInterfaces } from 'node:os'
import type { DemoPeople } from '@/db/demo/people'

/** Says on the terminal what is being done, and how long it took. */
export async function showStep<Value>(label: string, work: () => Promise<Value>): Promise<Value> {
  const startedAt = performance.now()
  process.stdout.write(`  ${label} …`)
  try {
    const value = await work()
    process.stdout.write(` ${((performance.now() - startedAt) / 1000).toFixed(1)} s\n`)
    return value
  } catch (error) {
    process.stdout.write(' failed\n')
    throw error
  }
}

/** Addresses under which other machines of the same network reach this one. */
export const lanAddresses = (): readonly string[] =>
  Object.values(networkInterfaces())
    .flatMap((addresses) => addresses ?? [])
    .filter(
      ({ family, internal, address }) => family === 'IPv4' && !internal && !address.startsWith('169.254.'),
    )
    .map(({ address }) => address)

const MAIN_ROLES = ['teacher', 'assistant', 'administrator']

/** Where to go and as whom. */
export function formatWelcome({
  publicUrl,
  lanUrls,
  demo,
}: Readonly<{ publicUrl: string; lanUrls: readonly string[]; demo: DemoPeople | null }>): string {
  const lines = ['', `Bicinium is ready:  ${publicUrl}`]
  if (lanUrls.length > 0) lines.push(`From phones in this network:  ${lanUrls.join('  ')}`)
  if (demo) {
    const leaders = demo.people.filter(({ role }) => MAIN_ROLES.includes(role))
    const students = demo.people.filter(({ role }) => !MAIN_ROLES.includes(role))
    lines.push(
      '',
      `Sign in as one of the invented school, password for all: ${demo.password}`,
      ...leaders.map(({ name, email, role }) => `  ${role.padEnd(14)} ${email.padEnd(36)} ${name}`),
      ...students
        .slice(0, 3)
        .map(({ name, email }) => `  ${'student'.padEnd(14)} ${email.padEnd(36)} ${name}`),
      `  … and ${students.length - 3} more students, listed on the sign-in page`,
      'Mail goes nowhere; read it on the page /demo/mail',
    )
  }
  return [...lines, '', 'Stop with Ctrl-C.', ''].join('\n')
}
