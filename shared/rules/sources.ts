/** A published work that rules are drawn from. */
export type Source = Readonly<{
  /** Author, title, year, as a class would cite it. */
  work: string
  /** Where it can be read; `null` for books that are only in print. */
  url: string | null
  /** How much of it was read for the catalogue. `memory`: known from the book and to be checked before it is quoted. */
  read: 'whole' | 'part' | 'memory' | 'computed'
}>

const source = (work: string, url: string | null, read: Source['read']): Source => ({ work, url, read })

/** Works by the short keys with which rules cite them. */
export const SOURCES = {
  FUX: source(
    'J. J. Fux, Gradus ad Parnassum, 1725, Book II; in English by A. Mann, The Study of Counterpoint, Norton 1943/1965',
    'https://idoc.pub/documents/contrapunto-de-fux-d2nvyj9oz0nk',
    'memory',
  ),
  FUXE: source(
    'Practical Rules for Learning Composition, an 18th-century English abridgement of Fux, ch. I',
    'https://vdocuments.net/gradus-ad-parnassum.html',
    'part',
  ),
  FUXN: source(
    'D. Colson, study notes on Mann’s Fux, ch. I–II',
    'http://dcolson.wikispaces.com/~Unit+1%2A',
    'part',
  ),
  MANNF: source(
    'A. Mann’s footnote on permitted melodic intervals, as typed out by a reader',
    'https://www.pianostreet.com/smf/index.php?topic=16133.0',
    'part',
  ),
  CHER: source(
    'L. Cherubini, Cours de contrepoint et de fugue, 1835; in English by M. Cowden Clarke, 1854',
    'https://wiki.bondari.com/cherubini_counterpoint_and_fugue:two_part_counterpoint:first_order',
    'part',
  ),
  BRIDGE: source(
    'J. F. Bridge, Counterpoint, Novello 1878',
    'https://wiki.bondari.com/bridges_counterpoint:simple_counterpoint',
    'part',
  ),
  GROVE: source(
    'W. S. Rockstro, “Strict Counterpoint”, Grove’s Dictionary of Music, vol. 3, 1883, pp. 742–743',
    'https://en.wikisource.org/wiki/Page:A_Dictionary_of_Music_and_Musicians_vol_3.djvu/754',
    'part',
  ),
  LEHM: source(
    'F. J. Lehmann, A Treatise on Simple Counterpoint in Forty Lessons, Schirmer 1907',
    'https://www.gutenberg.org/ebooks/16342',
    'whole',
  ),
  NOTAV: source(
    'Rules for Species of Strict Counterpoint in Two Parts, five pages, author not named',
    'http://notaviva.com/theory/cntrpnt001.html',
    'whole',
  ),
  OMT1: source(
    'K. Shaffer, B. Hughes, B. Moseley, Open Music Theory, 2014',
    'https://openmusictheory.github.io/cantusFirmus.html',
    'whole',
  ),
  OMT2: source(
    'M. Gotham, K. Shaffer, Open Music Theory, version 2, 2021',
    'https://pressbooks.nebraska.edu/openmusictheory/chapter/fifth-species-counterpoint',
    'part',
  ),
  RWU: source(
    'Roger Williams University, Modal Counterpoint, chs 2 and 4',
    'https://rwu.pressbooks.pub/musictheory/chapter/first-species-counterpoint',
    'part',
  ),
  MT21C: source(
    'R. Hutchinson, Music Theory for the 21st-Century Classroom, ch. 30',
    'https://musictheory.pugetsound.edu/mt21c/ThirdSpecies.html',
    'part',
  ),
  RUSH: source(
    'T. Rush, Music Theory for Musicians and Normal People: Species I, III, V',
    'https://issuu.com/tobyrush/docs/species1',
    'whole',
  ),
  GIRT: source(
    'I. Girton, course pages on fifth species',
    'https://irenegirton.com/irene-montefiore-girton/species-counterpoint-online/species-counterpoint-5th-species/',
    'part',
  ),
  LIST: source(
    'Listening Arts, course page on fourth species',
    'http://www.listeningarts.com/music/general_theory/species/4th.htm',
    'part',
  ),
  DAVID: source(
    'L. Davidson, course pages on third and fourth species',
    'http://www.lindsaydavidson.co.uk/counterpoint/species3.html',
    'whole',
  ),
  SOLON: source(
    '“2.3 Third Species”, chapter of a course book, author not named',
    'https://docslib.org/doc/2808251/2-3-third-species-pages',
    'part',
  ),
  SOTON: source(
    'University of Southampton, first species in three parts, after Fux',
    'http://www.soton.ac.uk/~lastras/palatine/sc_4.html',
    'part',
  ),
  VIGIL: source(
    'R. Vigil, Cantus Firmus: Principles of Melodic Motion, handout after Fux, Salzer–Schachter, Schmalfeldt, Schoenberg',
    'https://zh.scribd.com/document/324406003/Cantus-Firmus-Principles-of-Melodic-Motion',
    'part',
  ),
  CFH: source(
    'Rules for Writing a Cantus Firmus, handout, 8 rules',
    'https://www.scribd.com/doc/187053895/Rules-for-Writing-a-Cantus',
    'whole',
  ),
  ECR: source(
    'Easy counterpoint rules, handout',
    'https://www.scribd.com/document/414508720/EASY-COUNTERPOINT-RULES-txt',
    'part',
  ),
  GENN: source(
    'Species: general notes (all species), course handout',
    'https://docslib.org/doc/10641166/',
    'part',
  ),
  HSR: source(
    'Hard rules and soft rules: first species, handout after Stella Roberts and Peter Schubert',
    'https://docslib.org/doc/7883843/',
    'part',
  ),
  SCHUB: source(
    'P. Schubert, Modal Counterpoint, Renaissance Style, Oxford 1999/2008, as quoted in HSR',
    null,
    'part',
  ),
  LOEFF: source(
    'J. Loeffert, first-species guidelines, 2010',
    'https://www.coursehero.com/file/6456789/',
    'part',
  ),
  RATIO: source(
    'Rules for species counterpoint 2:1, handout',
    'https://www.coursehero.com/file/6203874/2-1RulesCounterpoint/',
    'whole',
  ),
  DAVD: source(
    'First and second species, notes from an undergraduate course',
    'https://davd33.fr/music-theory/first-species-counter-point.html',
    'whole',
  ),
  FLASH: source(
    'Revision cards for an undergraduate counterpoint course',
    'https://directcurrentmusic.com/music-flashcard/species-counterpoint-rules-9377/',
    'whole',
  ),
  TTU: source(
    'Texas Tech University, MUTH 1304, handout on suspensions, 2015',
    'https://studysoup.com/note/68000/ttu-muth-1304-fall-2015',
    'part',
  ),
  PERF: source(
    'Advanced rules for the treatment of perfect intervals: excerpts from Zarlino, Diruta, Fux, Salzer–Schachter, Clemmons',
    'https://www.scribd.com/document/359601389/perfect-intervals',
    'part',
  ),
  E2: source(
    'Guidelines for 16th-century strict modal counterpoint',
    'https://everything2.com/title/Guidelines+for+16th+Century+Strict+Modal+Counterpoint',
    'part',
  ),
  'E2-5': source(
    'Two-part fifth species counterpoint (florid)',
    'https://m.everything2.com/title/Two-Part+Fifth+Species+Counterpoint+%2528Florid%2529',
    'part',
  ),
  CCC: source(
    'A reader’s digest of Fux’s melodic rules, 2011',
    'http://cantuscontracantum.blogspot.com/2011/02/melodic-rules.html',
    'whole',
  ),
  SEQ: source(
    'Questions and answers on Fux’s third species and on the raised seventh (quotes Jeppesen)',
    'https://music.stackexchange.com/questions/93470',
    'part',
  ),
  TALK: source('Discussions of Fux’s first and fourth species', 'https://talkclassical.com', 'part'),
  WIKI: source(
    'Wikipedia, “Counterpoint”, section on species (cites Salzer and Schachter)',
    'https://en.wikipedia.org/wiki/Counterpoint',
    'part',
  ),
  SCHG: source(
    'T. Pankhurst, brief guide to fourth species',
    'http://www.schenkerguide.com/species4.html',
    'whole',
  ),
  MINO: source(
    'Two-part imitative counterpoint, rules sheet',
    'http://minotaurz.com/minotaur/edu/CPT_species/imitative_2part.html',
    'whole',
  ),
  ROSS: source(
    'C. Ross, MUSIC 3106, 16th-century counterpoint rules, handout after Jeppesen',
    'https://vdocuments.mx/music-3106-dr-c-ross-16th-century-counterpoint-rules-16th-century-counterpoint.html',
    'part',
  ),
  JEPP: source(
    'K. Jeppesen, Counterpoint: The Polyphonic Vocal Style of the Sixteenth Century, 1931/1939',
    null,
    'memory',
  ),
  'S&S': source('F. Salzer, C. Schachter, Counterpoint in Composition, 1969', null, 'memory'),
  EX: source(
    'Computed from Fux’s own 46 two-voice and 15 three-voice examples (transcription released CC0)',
    'https://fourscoreandmore.org/species',
    'computed',
  ),
} as const satisfies Readonly<Record<string, Source>>

export type SourceKey = keyof typeof SOURCES

/** The work behind a key, or `null` for a key nobody knows. */
export const findSource = (key: string): Source | null =>
  Object.hasOwn(SOURCES, key) ? SOURCES[key as SourceKey] : null
