import type { ReportContent } from '../../../../shared/reports/content.ts'
import { drawConversions, drawFurther, drawReadings, drawSamples } from './annex.ts'
import { drawEnd, drawFoot, drawPageNumbers } from './foot.ts'
import { drawHead } from './head.ts'
import { mm } from './ink.ts'
import { Paper } from './paper.ts'
import { drawPictures } from './picture.ts'
import { drawMethods, drawResults } from './results.ts'
import { drawWords } from './words.ts'

/** Pictures that stand on the report's own pages; more of them go to the annex. */
const firstPictures = 2

/** Draws a report as a PDF from what it says and nothing else: the same content gives the same bytes. */
export function drawReport(content: ReportContent): Promise<Buffer> {
  const paper = new Paper(content)
  drawHead(paper, content)
  drawResults(paper, content)
  drawMethods(paper, content)
  drawPictures(paper, content.pictures.slice(0, firstPictures))
  drawWords(paper, content)
  // a short annex goes on where the words end, a long one begins on a page of its own
  paper.y += mm(5)
  if (paper.pages === 1) paper.need(mm(85))
  drawSamples(paper, content)
  drawFurther(paper, content)
  drawConversions(paper, content)
  if (content.pictures.length > firstPictures) {
    paper.heading(paper.section(), 'Pictures', mm(55))
    drawPictures(paper, content.pictures.slice(firstPictures))
  }
  drawReadings(paper, content)
  drawEnd(paper, content)
  drawPageNumbers(paper, content)
  drawFoot(paper, content)
  return paper.bytes()
}
