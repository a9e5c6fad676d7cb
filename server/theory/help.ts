/** Shown by `npm run -s theory -- --help`. */
export const HELP = `npm run -s theory -- COMMAND [options] "D4 F4 E4 D4 …"

  check     what the rules have to say of a line, or of the cantus where no line is given
  count     how many ways there are to finish the line
  alive     for every bar, the notes that still lead to an end, and in how many ways
  solve     whole lines, best first (--order notes: in the order of their notes), --limit 10
  draw      lines drawn evenly from all there are, --seed 1 --times 1
  generate  cantus    --length 11 --taste (nothing to remark on either) --seed 1 --times 1
            solution  as draw
            faults    a line with exactly the faults asked for: --fault par-perfect --fault dir-perfect:2
                      --apart 2 (bars from the end of one fault to the end of the next) --seed 1 --times 1

The exercise:
  --species 1…5  --position above|below  --mode dorian  --final D
  --rules open-undergrad|fux-mann|jeppesen-16c|conservatoire|starter|core-1|core-2|FILE.json
  --low D4 --high D6     compass of the line
  --cantus "D4 F4 …"     in place of the melody at the end
  --line "r:2 A4:2 | …"  what is written: lengths in quarters, ~ after a tied note, r a rest, | between bars, . unwritten
  --aside 3,4            bars that are not read
  --json                 for programs

A melody may also be a MusicXML file that ends in .musicxml or .xml.`
