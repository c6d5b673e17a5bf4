import { useEffect, useRef, useState } from "react";

/** Milliseconds without a letter after which the search is made. */
const pause = 180;

/**
 * What stands in a search field, and the search it leads to: the field follows each letter, the search a pause, and a
 * search that comes from elsewhere (the way back, a cleared filter) is put into the field.
 */
export function useTyped(value: string, onChange: (value: string) => void): [string, (text: string) => void] {
  const [typed, setTyped] = useState(value);
  const sent = useRef(value);
  const send = useRef(onChange);
  useEffect(() => {
    send.current = onChange;
  });
  useEffect(() => {
    if (value === sent.current) return;
    sent.current = value;
    setTyped(value);
  }, [value]);
  useEffect(() => {
    if (typed === sent.current) return;
    const timer = setTimeout(() => {
      sent.current = typed;
      send.current(typed);
    }, pause);
    return () => clearTimeout(timer);
  }, [typed]);
  return [typed, setTyped];
}
