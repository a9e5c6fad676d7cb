export {
  formatCantusWords,
  formatLineText,
  lastBarOf,
  MAX_TEXT_CHARACTERS,
  parseCantusWords,
  parseLineText,
} from './line-text'
export type { ReadingProblem } from './reading-problem'
export { formatMusicXml, type ScoreToWrite } from './format-music-xml'
export { parseMusicXml, type MusicXmlScore } from './parse-music-xml'
export { MAX_XML_CHARACTERS } from './xml'
