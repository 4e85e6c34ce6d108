import { useId } from 'react';

interface Props {
  id: string;
  value: string;
  /** Vendors that are known already. */
  vendors: readonly string[];
  onChange: (vendor: string) => void;
  error?: string | undefined;
}

const same = (a: string, b: string) => a.trim().toLowerCase() === b.trim().toLowerCase();

/** The vendor's name, offering those that are known; says when a name is new, since it may be a slip of the pen. */
export function VendorField({ id, value, vendors, onChange, error }: Props) {
  const list = useId();
  const isNew = value.trim() !== '' && vendors.length > 0 && !vendors.some((vendor) => same(vendor, value));
  return (
    <div className="field">
      <label htmlFor={id} className="label">
        Vendor
      </label>
      <input
        id={id}
        className="input"
        list={list}
        value={value}
        onChange={(event) => onChange(event.target.value)}
        autoComplete="off"
        spellCheck={false}
        aria-invalid={error ? true : undefined}
        aria-describedby={error ? `${id}-hint ${id}-error` : `${id}-hint`}
      />
      <datalist id={list}>
        {vendors.map((vendor) => (
          <option key={vendor} value={vendor} />
        ))}
      </datalist>
      <span id={`${id}-hint`} className="hint" role="status">
        {isNew ? 'A new vendor: it is added with this sheet.' : 'Whose sheet this is, as printed.'}
      </span>
      {error && (
        <span id={`${id}-error`} className="error">
          {error}
        </span>
      )}
    </div>
  );
}
