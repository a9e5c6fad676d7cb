import { cantus } from './cantus'
import { courses } from './courses'
import { demo } from './demo'
import { lessons } from './lessons'
import { people } from './people'
import { ruleSets } from './rule-sets'

/** Every request the server answers, beside better-auth's own under `/api/auth`. */
export const api = { people, courses, cantus, ruleSets, lessons, demo } as const
