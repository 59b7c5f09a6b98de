/** A grey place where text will stand, of the size that it will have. */
export function Bone({ className }: { readonly className: string }) {
  return <span className={`block rounded-[2px] bg-rule/60 motion-safe:animate-pulse ${className}`} />;
}

/** Rows of a table that is on its way. */
export function BoneRows({ rows, label }: { readonly rows: number; readonly label: string }) {
  return (
    <div role="status" aria-label={label}>
      {Array.from({ length: rows }, (_, row) => (
        <div key={row} className="flex items-center gap-6 border-b border-rule py-3.5">
          <Bone className="h-4 w-24" />
          <Bone className="h-4 w-2/5" />
          <Bone className="ml-auto h-4 w-32" />
        </div>
      ))}
    </div>
  );
}
