import { useId, type InputHTMLAttributes, type ReactNode, type TextareaHTMLAttributes } from 'react';

const BOX = 'w-full rounded-[3px] border border-pencil/60 bg-sheet px-2.5 py-1.5 text-ink placeholder:text-pencil';

interface LabelledProps {
  readonly label: string;
  readonly hint?: ReactNode;
  /** What is wrong with the value; null where nothing is. */
  readonly fault?: string | null;
}

interface FieldProps extends LabelledProps, InputHTMLAttributes<HTMLInputElement> {}

/** A labelled input, with a hint and the fault that the server found in it. */
export function Field({ label, hint, fault, className = '', ...rest }: FieldProps) {
  const id = useId();
  return (
    <div className={className}>
      <label htmlFor={id} className="mb-1 block font-medium">
        {label}
      </label>
      <input id={id} className={`${BOX} min-h-9`} {...describe(id, hint, fault)} {...rest} />
      <Below id={id} hint={hint} fault={fault} />
    </div>
  );
}

interface TextFieldProps extends LabelledProps, TextareaHTMLAttributes<HTMLTextAreaElement> {}

export function TextField({ label, hint, fault, className = '', ...rest }: TextFieldProps) {
  const id = useId();
  return (
    <div className={className}>
      <label htmlFor={id} className="mb-1 block font-medium">
        {label}
      </label>
      <textarea id={id} className={`${BOX} block resize-y`} rows={3} {...describe(id, hint, fault)} {...rest} />
      <Below id={id} hint={hint} fault={fault} />
    </div>
  );
}

function describe(id: string, hint: ReactNode, fault: string | null | undefined) {
  const hasFault = fault !== null && fault !== undefined;
  return {
    'aria-invalid': hasFault || undefined,
    'aria-describedby': hasFault || hint !== undefined ? `${id}-below` : undefined,
  };
}

function Below({
  id,
  hint,
  fault,
}: {
  readonly id: string;
  readonly hint: ReactNode;
  readonly fault: string | null | undefined;
}) {
  if (fault !== null && fault !== undefined) {
    return (
      <p id={`${id}-below`} className="mt-1 text-madder" role="alert">
        <span aria-hidden="true">▲</span> {fault}
      </p>
    );
  }
  return hint === undefined ? null : (
    <p id={`${id}-below`} className="mt-1 text-[0.8125rem] text-pencil">
      {hint}
    </p>
  );
}
