import { printBytes, printSent } from '@/components/sheets/words';
import { Button } from '@/components/ui/Button';
import { Progress } from '@/components/ui/Progress';
import { CHOOSE_BUTTON } from './DropZone';
import { SignInAgain } from './FormFrame';
import { isActive, isSettled, pageNumber, type Upload } from './upload-state';
import { focusSoon } from './use-page';
import type { Uploads } from './use-uploads';

/** Files on their way to the sheet and what became of them. */
export function UploadList({ uploads }: { uploads: Uploads }) {
  const { state } = uploads;
  if (state.uploads.length === 0) return null;
  const clear = () => {
    uploads.clear();
    focusSoon(CHOOSE_BUTTON);
  };
  return (
    <div>
      <ul className="flex flex-col" aria-label="Files">
        {state.uploads.map((upload) => (
          <UploadRow key={upload.key} upload={upload} uploads={uploads} />
        ))}
      </ul>
      {state.uploads.some(isSettled) && (
        <Button size="small" variant="quiet" className="mt-2" onPress={clear}>
          Clear the list
        </Button>
      )}
    </div>
  );
}

function UploadRow({ upload, uploads }: { upload: Upload; uploads: Uploads }) {
  const { progress } = upload;
  const waits = progress.is === 'waiting' || isActive(upload);
  const cancel = () => {
    uploads.cancel(upload);
    focusSoon(CHOOSE_BUTTON);
  };
  return (
    <li className="flex flex-wrap items-center gap-x-3 gap-y-1 border-b border-faint py-1.5">
      <div className="min-w-0 grow basis-56">
        <Outcome upload={upload} pages={uploads.state.pages} />
      </div>
      {waits && (
        <Button size="small" aria-label={`Cancel ${upload.name}`} onPress={cancel}>
          Cancel
        </Button>
      )}
      {progress.is === 'refused' && progress.worthRetrying && (
        <Button size="small" aria-label={`Try again: ${upload.name}`} onPress={() => uploads.again(upload)}>
          Try again
        </Button>
      )}
    </li>
  );
}

function Outcome({ upload, pages }: { upload: Upload; pages: Uploads['state']['pages'] }) {
  const { progress, name, bytes } = upload;
  switch (progress.is) {
    case 'waiting':
      return <Line name={name}>waits, {printBytes(bytes)}</Line>;
    case 'sending':
      return (
        <Progress label={name} value={bytes === 0 ? null : progress.sentBytes / bytes} detail={printSent(progress.sentBytes, bytes)} />
      );
    case 'takingIn':
      return <Progress label={name} value={null} detail="taking in" />;
    case 'cancelled':
      return <Line name={name}>cancelled</Line>;
    case 'refused':
      return (
        <>
          <Line name={name}>not taken</Line>
          <p className="error">{progress.sentence}</p>
          {progress.signedOut && <SignInAgain />}
        </>
      );
    case 'done':
      return (
        <>
          <Line name={name}>{doneWords(progress.again, pageNumber(pages, progress.pageId))}</Line>
          {progress.already.map((sheet) => (
            <p key={sheet.sheetId} className="hint">
              The same file is already on <a href={`/sheets/${sheet.sheetId}`}>{sheet.sheet}</a>.
            </p>
          ))}
        </>
      );
  }
}

const doneWords = (again: boolean, number: number) =>
  number === 0 ? 'taken off again' : again ? `already page ${number} of this sheet, so nothing was added` : `is page ${number}`;

const Line = ({ name, children }: { name: string; children: React.ReactNode }) => (
  <p className="flex flex-wrap justify-between gap-x-3">
    <span className="min-w-0 break-all">{name}</span>
    <span className="muted">{children}</span>
  </p>
);
