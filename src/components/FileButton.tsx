import { type ReactNode, useRef } from 'react';
import { Button } from './Button';
import type { ButtonLook, ButtonSize } from './buttonLook';
import { GoButton } from './GoButton';

type Props = {
  children: ReactNode;
  /** as of `input`: “video/*,.mov” */
  accept?: string;
  choose?: 'one' | 'several';
  onFiles: (files: File[]) => void;
  look?: ButtonLook | 'go';
  size?: ButtonSize;
  busy?: string | undefined;
  disabled?: boolean;
  /** read out with the hidden input: “Choose recordings” */
  label: string;
};

/** A button that opens the device's own picker. */
export function FileButton({ children, accept, choose = 'one', onFiles, look, size, busy, disabled, label }: Props) {
  const input = useRef<HTMLInputElement>(null);
  const open = () => input.current?.click();
  return (
    <>
      <input
        ref={input}
        type="file"
        accept={accept}
        multiple={choose === 'several'}
        aria-label={label}
        tabIndex={-1}
        className="sr-only"
        onChange={(event) => {
          const files = [...(event.target.files ?? [])];
          // so that the same file can be chosen again after a failure
          event.target.value = '';
          if (files.length > 0) onFiles(files);
        }}
      />
      {look === 'go' ? (
        <GoButton {...{ size, busy, disabled }} onClick={open}>
          {children}
        </GoButton>
      ) : (
        <Button {...{ look, size, busy, disabled }} onClick={open}>
          {children}
        </Button>
      )}
    </>
  );
}
