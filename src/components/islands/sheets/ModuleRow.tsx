import { useState, type ReactNode } from 'react';
import { moduleFacts, partName, ratingText } from '@/components/sheets/words';
import { Button } from '@/components/ui/Button';
import { Chip } from '@/components/ui/Chip';
import type { VendorModule } from '@/lib/contracts';
import { editButton } from './use-modules';

interface Props {
  module: VendorModule;
  /** Own reading of it from this sheet, to go on with. */
  draft: number | undefined;
  may: { readonly edit: boolean; readonly start: boolean; readonly add: boolean };
  onStart: () => Promise<void>;
  onEdit: () => void;
  onAddLike: () => void;
  /** The form, while the module is being changed. */
  children?: ReactNode;
}

/** One module: what is stated about it, and what can be done with it. */
export function ModuleRow({ module, draft, may, onStart, onEdit, onAddLike, children }: Props) {
  const name = partName(module);
  const [starting, setStarting] = useState(false);
  const start = async () => {
    setStarting(true);
    await onStart();
    setStarting(false);
  };
  return (
    <li className="border-b border-faint py-3 last:border-b-0 last:pb-0">
      <div className="flex flex-wrap items-start gap-x-4 gap-y-2">
        <div className="min-w-0 grow basis-72">
          <p className="flex flex-wrap items-baseline gap-x-2">
            {module.approved ? <a href={`/modules/${module.id}`}>{name}</a> : <b>{name}</b>}
            {module.approved && <Chip tone="approved">approved</Chip>}
          </p>
          <p className="hint">{moduleFacts(module).join(' · ') || 'Nothing is stated about its size.'}</p>
          {module.ratings.length === 0 && <p className="hint">No ratings are stated.</p>}
          {module.ratings.map((rating) => (
            <p key={rating.hotSideC} className="hint">
              Hot side {ratingText(rating)}
            </p>
          ))}
        </div>
        <div className="flex flex-wrap gap-2">
          {draft !== undefined && (
            <a className="btn btn-small" href={`/bench/${draft}`} aria-label={`Go on with your reading of ${name}`}>
              Go on with your reading
            </a>
          )}
          {may.start && (
            <Button
              size="small"
              variant={draft === undefined ? 'plain' : 'quiet'}
              aria-label={draft === undefined ? `Start a reading of ${name}` : `Start another reading of ${name}`}
              isPending={starting}
              onPress={() => void start()}
            >
              {draft === undefined ? 'Start a reading' : 'Start another'}
            </Button>
          )}
          {may.edit && !children && (
            <Button size="small" variant="quiet" id={editButton(module.id)} aria-label={`Edit ${name}`} onPress={onEdit}>
              Edit
            </Button>
          )}
          {may.add && (
            <Button size="small" variant="quiet" aria-label={`Add one like it: ${name}`} onPress={onAddLike}>
              Add one like it
            </Button>
          )}
        </div>
      </div>
      {children && <div className="mt-3 border-l-2 border-line pl-4">{children}</div>}
    </li>
  );
}
