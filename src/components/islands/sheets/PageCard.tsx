import { useState } from 'react';
import { api, ApiProblem } from '@/components/islands/api';
import { kindOfFile, printBytes, printPixels } from '@/components/sheets/words';
import { Button } from '@/components/ui/Button';
import type { PageView } from '@/lib/contracts';
import { focusSoon } from './use-page';

interface Props {
  sheetId: number;
  page: PageView;
  number: number;
  mayRemove: boolean;
  onRemoved: () => void;
  /** Where the keyboard goes when this card is gone. */
  focusAfter: string;
}

/** One page: its picture, what came in and how it was changed, the file as it came. */
export function PageCard({ sheetId, page, number, mayRemove, onRemoved, focusAfter }: Props) {
  const { picture } = page;
  return (
    <li className="flex flex-col gap-1">
      <a href={picture.url} draggable={false} className="block h-44 border border-line bg-paper p-1">
        <img
          src={`${picture.url}/thumbnail`}
          alt={`Page ${number}, ${page.label}: whole picture`}
          width={picture.width}
          height={picture.height}
          loading="lazy"
          decoding="async"
          draggable={false}
          className="h-full w-full object-contain"
        />
      </a>
      <p className="break-words">
        <span className="muted">{number}</span> <b>{page.label}</b>
      </p>
      <p className="hint">
        {printPixels(picture)} · {kindOfFile(picture.mediaType)}, {printBytes(picture.bytes)}
      </p>
      {picture.notes.map((note) => (
        <p key={note} className="hint">
          {note}
        </p>
      ))}
      <div className="mt-1 flex flex-wrap items-center gap-2">
        <a className="btn btn-small" href={`${picture.url}/original`} download={picture.name} aria-label={`Original of page ${number}`}>
          Original
        </a>
        {mayRemove && (
          <RemovePage path={`/api/sheets/${sheetId}/pages/${page.id}`} number={number} onRemoved={onRemoved} focusAfter={focusAfter} />
        )}
      </div>
    </li>
  );
}

function RemovePage({ path, number, onRemoved, focusAfter }: { path: string; number: number; onRemoved: () => void; focusAfter: string }) {
  const [asking, setAsking] = useState(false);
  const [busy, setBusy] = useState(false);
  const [refusal, setRefusal] = useState('');
  const [keep, open] = [`keep-${path}`, `remove-${path}`];
  const ask = (now: boolean) => {
    setAsking(now);
    setRefusal('');
    focusSoon(now ? keep : open);
  };
  const remove = async () => {
    setBusy(true);
    try {
      await api.delete(path);
      onRemoved();
      focusSoon(focusAfter);
    } catch (error) {
      if (!(error instanceof ApiProblem)) throw error;
      setBusy(false);
      setAsking(false);
      setRefusal(error.detail);
      focusSoon(open);
    }
  };
  return (
    <>
      {asking ? (
        <>
          <span>Take page {number} off the sheet?</span>
          <Button size="small" id={keep} onPress={() => ask(false)}>
            Keep it
          </Button>
          <Button size="small" variant="danger" isPending={busy} onPress={() => void remove()}>
            Take it off
          </Button>
        </>
      ) : (
        <Button size="small" variant="quiet" id={open} aria-label={`Remove page ${number}`} onPress={() => ask(true)}>
          Remove
        </Button>
      )}
      <p role="alert" className={refusal ? 'error basis-full' : 'sr-only'}>
        {refusal}
      </p>
    </>
  );
}
