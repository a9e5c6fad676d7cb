/** E6: what a fault exercise costs, from the request to the answer key, in this process, on one core. */
import { generateFaults, type FaultRequest } from '@/shared/generate'
import { findPreset, readExercise, type RuleSet } from '@/shared/rules'
import type { BenchGroup } from './row'

const RUNS = 25
const WARM_UPS = 5

/** Three faults two bars apart, over Fux's Dorian and Lydian canti (Gradus ad Parnassum, 1725). */
const REQUESTS: readonly (readonly [name: string, request: FaultRequest])[] = [
  [
    'open-undergrad, Dorian, above',
    requestOf('open-undergrad', 'dorian', 'D', 'D4 F4 E4 D4 G4 F4 A4 G4 F4 E4 D4'),
  ],
  ['fux-mann, Lydian, above', requestOf('fux-mann', 'lydian', 'F', 'F3 G3 A3 F3 D3 E3 F3 C4 A3 F3 G3 F3')],
]

function requestOf(preset: string, mode: 'dorian' | 'lydian', final: string, cantus: string): FaultRequest {
  return {
    exercise: readExercise({ cantus: cantus.split(' '), mode, final, species: 1, position: 'above' }),
    ruleSet: findPreset(preset) as RuleSet,
    faults: [
      { rule: 'par-perfect', times: 1 },
      { rule: 'dir-perfect', times: 1 },
      { rule: 'vert-consonance-set', times: 1 },
    ],
    apart: 2,
  }
}

export const runBench: BenchGroup = (tell) =>
  Promise.resolve(
    REQUESTS.map(([name, request]) => {
      tell(`three faults, ${name}`)
      const samples = Array.from({ length: WARM_UPS + RUNS }, (_, seed) => {
        const startedAt = process.cpuUsage()
        const made = generateFaults({ ...request, seed })
        const { user, system } = process.cpuUsage(startedAt)
        if (!made.ok) throw new Error(made.reason.message)
        return (user + system) / 1000
      })
      return {
        line: 'E6',
        work: `a fault exercise with exactly three faults: ${name}`,
        samples: samples.slice(WARM_UPS),
        unit: 'ms',
        goal: 'under 100',
      }
    }),
  )
