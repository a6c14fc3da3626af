"use client";
import { type RefObject, useEffect, useRef } from "react";

/** For a form: after a submit that found errors, the first wrong field gets the focus. `errors` is a new object for every submit. */
export function useFocusFirstError(errors: object): RefObject<HTMLFormElement | null> {
  const form = useRef<HTMLFormElement>(null);
  useEffect(() => {
    if (Object.keys(errors).length === 0) return;
    form.current?.querySelector<HTMLElement>("[aria-invalid=true]")?.focus();
  }, [errors]);
  return form;
}

/** Leads to the first length that cannot be read and tells that there is one: what stood there before must not be sent in its place. */
export function focusUnreadField(form: HTMLFormElement): boolean {
  const unread = form.querySelector<HTMLInputElement>("input:invalid");
  unread?.focus();
  return unread !== null;
}
