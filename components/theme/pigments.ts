/** Roles of colour, named after the pigments of a manuscript page. Colour never speaks alone: a shape goes with it. */
export type Pigments = Readonly<{
  /** The page. */
  vellum: string
  /** Raised ground: sheets, table rows, fields. */
  leaf: string
  /** Ink: text, staff, the cantus. */
  lampblack: string
  /** The counterpoint, links, focus. */
  azurite: string
  /** Released, in progress, confirm. */
  verdigris: string
  /** A breach of a law, and what cannot be undone. */
  minium: string
  /** A remark on a preference. */
  orpiment: string
  /** Secondary text, frozen. */
  lead: string
  /** Rules between things; no text is set in it. */
  hairline: string
  /** Edges of fields and controls: strong enough to be seen as an edge. */
  edge: string
}>
export type Pigment = keyof Pigments

export const LIGHT: Pigments = {
  vellum: '#F2F4F0',
  leaf: '#FBFCFA',
  lampblack: '#16211F',
  azurite: '#1E4E79',
  verdigris: '#0E6B5C',
  minium: '#B5301A',
  orpiment: '#8A5A00',
  lead: '#5B6763',
  hairline: '#C9D0CA',
  edge: '#7C8883',
}

export const DARK: Pigments = {
  vellum: '#12181B',
  leaf: '#1A2226',
  lampblack: '#E9EEEA',
  azurite: '#8CC1EE',
  verdigris: '#6FD3BD',
  minium: '#FF8C73',
  orpiment: '#F2C14E',
  lead: '#A6B3AE',
  hairline: '#34414A',
  edge: '#6F7D84',
}

/** Every pair in which text, or the shape of a control, is set on a ground, with the least contrast WCAG 2.2 AA asks. */
export const PAIRS: readonly Readonly<{ ink: Pigment; ground: Pigment; atLeast: number }>[] = [
  ...(['lampblack', 'azurite', 'verdigris', 'minium', 'orpiment', 'lead'] as const).flatMap((ink) =>
    (['vellum', 'leaf'] as const).map((ground) => ({ ink, ground, atLeast: 4.5 })),
  ),
  // Words on filled buttons and on the rung in hand.
  ...(['azurite', 'verdigris', 'minium'] as const).map((ground) => ({
    ink: 'vellum' as const,
    ground,
    atLeast: 4.5,
  })),
  ...(['vellum', 'leaf'] as const).map((ground) => ({ ink: 'edge' as const, ground, atLeast: 3 })),
]
