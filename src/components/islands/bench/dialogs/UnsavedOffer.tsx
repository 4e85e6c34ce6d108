import { useEffect, useState } from 'react';
import { Button } from '@/components/ui/Button';
import { Dialog } from '@/components/ui/Dialog';
import { sameDocument } from '@/lib/editor';
import { clock } from '../state/clock';
import { useTools } from '../state/tools';
import type { UnsavedWork } from '../state/unsaved';
import { Versions } from './Versions';

/** Work that a crash or an expired session kept from the server is offered before anything else is done. */
export function UnsavedOffer() {
  const { reading, unsaved, store, frozen } = useTools();
  const [work, setWork] = useState<UnsavedWork | null>(null);

  useEffect(() => {
    let here = true;
    void unsaved.find(reading.id).then((found) => {
      if (!found || !here) return;
      if (sameDocument(found.document, reading.document)) void unsaved.forget(reading.id, 'whatever');
      else setWork(found);
    });
    return () => void (here = false);
  }, [unsaved, reading]);

  if (!work) return null;
  const leave = () => {
    void unsaved.forget(reading.id, 'whatever');
    setWork(null);
  };
  const take = () => {
    store.perform({ type: 'replace', document: work.document, why: 'unsaved' });
    setWork(null);
  };
  return (
    <Dialog
      title="Work that was not saved"
      role="alertdialog"
      mustAnswer
      wide
      isOpen
      onClose={() => {}}
      actions={
        <>
          <Button onPress={() => void import('../state/files').then((files) => files.downloadDraft(reading, work.document))}>
            Download it
          </Button>
          <Button onPress={leave}>Leave it</Button>
          {!frozen && (
            <Button variant="primary" onPress={take}>
              Take it up again
            </Button>
          )}
        </>
      }
    >
      <p className="mb-2">{explain(work, reading.version, reading.savedAt, frozen)}</p>
      <Versions
        mine={{ document: work.document, head: `Not saved, ${clock(work.at)}` }}
        theirs={{ document: reading.document, head: `Saved, ${clock(reading.savedAt)}` }}
      />
    </Dialog>
  );
}

const explain = (work: UnsavedWork, version: number, savedAt: string, frozen: boolean): string => {
  const kept = `This browser kept work of ${clock(work.at)} that never reached the server.`;
  if (frozen) return `${kept} The reading can no longer be changed; you can download the work.`;
  return work.version === version
    ? kept
    : `${kept} The reading has been saved since, at ${clock(savedAt)}: taking the work up again replaces that version, and Undo brings it back.`;
};
