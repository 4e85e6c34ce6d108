import { sheetTitle, numberAndRevision } from '@/components/sheets/words';
import type { PictureView, ReadingView } from '@/lib/contracts';

/** A picture that charts stand on, and the sheet and page it comes from. */
export interface SourcedPicture {
  readonly picture: PictureView;
  readonly source: string;
}

/** The pictures of a reading's charts, each once, in the order of the charts. */
export function picturesOf(reading: ReadingView): SourcedPicture[] {
  const known = new Map<number, SourcedPicture>();
  for (const sheet of reading.sheets)
    for (const page of sheet.pages)
      if (!known.has(page.picture.id)) {
        const name = sheet.title ? [sheet.title, numberAndRevision(sheet)].filter(Boolean).join(', ') : sheetTitle(sheet);
        known.set(page.picture.id, { picture: page.picture, source: [`sheet ${name}`, page.label].filter(Boolean).join(', page ') });
      }
  const ids = [...new Set(reading.document.charts.map((chart) => chart.pictureId))];
  return ids.flatMap((id) => known.get(id) ?? []);
}
