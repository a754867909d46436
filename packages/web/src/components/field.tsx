import { useId } from 'react';
import type { ComponentProps, ReactNode } from 'react';

interface FieldProps {
  label: ReactNode;
  /** Beside the label, like a link. */
  aside?: ReactNode;
  hint?: ReactNode;
  error?: string | undefined;
  className?: string;
}

function Frame({
  label,
  aside,
  hint,
  error,
  className = '',
  id,
  children,
}: FieldProps & { id: string; children: ReactNode }) {
  return (
    <div className={`fld ${className}`}>
      <span className="lab">
        <label htmlFor={id}>{label}</label>
        {aside}
      </span>
      {children}
      {error ? (
        <p className="tape err" id={`${id}-err`} role="alert">
          {error}
        </p>
      ) : null}
      {hint ? (
        <p className="hint" id={`${id}-hint`}>
          {hint}
        </p>
      ) : null}
    </div>
  );
}

function described(id: string, { error, hint }: FieldProps) {
  const by = [error ? `${id}-err` : '', hint ? `${id}-hint` : ''].filter(Boolean).join(' ');
  return { id, 'aria-invalid': error ? true : undefined, 'aria-describedby': by || undefined };
}

export function TextField({
  label,
  aside,
  hint,
  error,
  className,
  ...input
}: FieldProps & Omit<ComponentProps<'input'>, 'id'>) {
  const id = useId();
  const frame = { label, aside, hint, error, className };
  return (
    <Frame {...frame} id={id}>
      <input className="inp" {...described(id, frame)} {...input} />
    </Frame>
  );
}

export function TextArea({
  label,
  aside,
  hint,
  error,
  className,
  ...input
}: FieldProps & Omit<ComponentProps<'textarea'>, 'id'>) {
  const id = useId();
  const frame = { label, aside, hint, error, className };
  return (
    <Frame {...frame} id={id}>
      <textarea className="inp" {...described(id, frame)} {...input} />
    </Frame>
  );
}

export function SelectField({
  label,
  aside,
  hint,
  error,
  className,
  children,
  ...input
}: FieldProps & Omit<ComponentProps<'select'>, 'id'>) {
  const id = useId();
  const frame = { label, aside, hint, error, className };
  return (
    <Frame {...frame} id={id}>
      <select className="inp" {...described(id, frame)} {...input}>
        {children}
      </select>
    </Frame>
  );
}

/** What a SelectField offers when it is things with a name. */
export function NamedOptions({ of }: { of: readonly { id: string; name: string }[] }) {
  return of.map(({ id, name }) => (
    <option key={id} value={id}>
      {name}
    </option>
  ));
}

export function CheckField({ label, ...input }: { label: ReactNode } & Omit<ComponentProps<'input'>, 'type'>) {
  return (
    <label className="check">
      <input type="checkbox" {...input} />
      <span>{label}</span>
    </label>
  );
}
