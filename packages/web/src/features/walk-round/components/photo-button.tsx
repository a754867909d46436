import type { ReactNode } from 'react';

/** Opens the camera, or the phone's pictures, and hands over what was taken. The same picture may be picked twice. */
export function PhotoButton({
  className,
  isCamera,
  isBusy,
  onFile,
  children,
}: {
  className: string;
  isCamera: boolean;
  isBusy: boolean;
  onFile: (file: File) => void;
  children: ReactNode;
}) {
  return (
    <label className={`${className} wr-file`} aria-busy={isBusy || undefined}>
      <input
        type="file"
        accept="image/*"
        {...(isCamera && { capture: 'environment' })}
        disabled={isBusy}
        onChange={(event) => {
          const [file] = event.target.files ?? [];
          event.target.value = '';
          if (file) onFile(file);
        }}
      />
      {children}
    </label>
  );
}
