import { printBytes } from '@/components/sheets/words';
import { EmptyState } from '@/components/ui/EmptyState';
import { ErrorBoundary } from '@/components/ui/ErrorBoundary';
import { Status } from '@/components/ui/Toast';
import type { PageView } from '@/lib/contracts';
import { DropZone } from './DropZone';
import { PageCard } from './PageCard';
import { UploadList } from './UploadList';
import { isSettled } from './upload-state';
import { useLeaveGuard } from './use-page';
import { useUploads } from './use-uploads';

interface Props {
  sheetId: number;
  pages: readonly PageView[];
  /** The largest file the server takes. */
  mostBytes: number;
  mayUpload: boolean;
  mayEdit: boolean;
}

const HEADING = 'pages';

function Pages({ sheetId, pages: first, mostBytes, mayUpload, mayEdit }: Props) {
  const uploads = useUploads(sheetId, first, mostBytes);
  const { pages, said } = uploads.state;
  useLeaveGuard(uploads.state.uploads.some((upload) => !isSettled(upload)));
  const gallery = (
    <ol className="grid grid-cols-[repeat(auto-fill,minmax(min(13rem,100%),1fr))] gap-4">
      {pages.map((page, at) => (
        <PageCard
          key={page.id}
          sheetId={sheetId}
          page={page}
          number={at + 1}
          mayRemove={mayEdit}
          onRemoved={() => uploads.removed(page.id)}
          focusAfter={HEADING}
        />
      ))}
    </ol>
  );
  return (
    <section aria-labelledby={HEADING}>
      <div className="mb-2 flex flex-wrap items-center gap-x-3">
        <h2 id={HEADING} tabIndex={-1} className="mb-0 leading-6">
          Pages
        </h2>
        <Status>{said}</Status>
      </div>
      {mayUpload ? (
        <DropZone labels={pages.map((page) => page.label)} largest={printBytes(mostBytes)} empty={pages.length === 0} onFiles={uploads.add}>
          <UploadList uploads={uploads} />
          {pages.length > 0 && gallery}
        </DropZone>
      ) : (
        <div className="sheet p-4">
          {pages.length > 0 ? gallery : <EmptyState title="No pages">Nothing has been uploaded to this sheet.</EmptyState>}
        </div>
      )}
    </section>
  );
}

/** Pages of a sheet: pictures that are there, and more by drop, browse or paste. */
export const SheetPages = (props: Props) => (
  <ErrorBoundary>
    <Pages {...props} />
  </ErrorBoundary>
);
