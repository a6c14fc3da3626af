"use client";
import { X } from "lucide-react";
import { Dialog } from "radix-ui";
import { type ReactNode, useRef } from "react";

interface Props {
  open: boolean;
  onOpenChange: (open: boolean) => void;
  title: string;
  /** A sentence on what this is for. */
  lead?: string;
  /** For pictures and lists that need the room. */
  wide?: boolean;
  children: ReactNode;
}

/** A dialog over the page: focus stays inside, Escape closes it, and the focus goes back to where it was. */
export function Modal({ open, onOpenChange, title, lead, wide = false, children }: Props) {
  const opener = useRef<Element | null>(null);
  return (
    <Dialog.Root open={open} onOpenChange={onOpenChange}>
      <Dialog.Portal>
        <Dialog.Overlay className="fixed inset-0 z-40 bg-graphite/50" />
        <Dialog.Content
          className={`fixed top-1/2 left-1/2 z-50 max-h-[92dvh] ${wide ? "w-[min(60rem,calc(100vw-1.5rem))]" : "w-[min(34rem,calc(100vw-1.5rem))]"} -translate-x-1/2 -translate-y-1/2 overflow-y-auto rounded-lg border border-line bg-sheet p-5 shadow-xl`}
          onOpenAutoFocus={() => {
            opener.current = document.activeElement;
          }}
          onCloseAutoFocus={(event) => {
            // By itself the dialog only finds back to a trigger, and many are opened by a key or from elsewhere.
            event.preventDefault();
            if (opener.current instanceof HTMLElement) opener.current.focus();
          }}
          {...(!lead && { "aria-describedby": undefined })}
        >
          <div className="mb-4 flex items-start justify-between gap-4">
            <div>
              <Dialog.Title className="text-xl">{title}</Dialog.Title>
              {lead && <Dialog.Description className="mt-1 text-sm text-pencil">{lead}</Dialog.Description>}
            </div>
            <Dialog.Close className="grid size-10 shrink-0 place-items-center rounded-md hover:bg-chalk-wash" aria-label="Close">
              <X className="size-5" aria-hidden="true" />
            </Dialog.Close>
          </div>
          {children}
        </Dialog.Content>
      </Dialog.Portal>
    </Dialog.Root>
  );
}
