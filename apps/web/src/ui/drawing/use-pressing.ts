import { type KeyboardEvent, type PointerEvent, useEffect, useRef, useState } from 'react';

export interface Pressing {
  onPress?: (key: string) => void;
  onRelease?: (key: string) => void;
}

/**
 * Pressing by pointer (drawn along, it goes from voice to voice) and by keyboard: arrow keys move along,
 * Space or Enter sounds for as long as it is held. One stop of the Tab key for the whole rank.
 */
export function usePressing(keys: readonly string[], { onPress, onRelease }: Pressing) {
  const [pressed, setPressed] = useState<string>();
  const [reachable, setReachable] = useState(keys[0]);
  const now = useRef<string>(undefined);

  const release = () => {
    if (now.current === undefined) return;
    onRelease?.(now.current);
    now.current = undefined;
    setPressed(undefined);
  };
  const press = (key: string) => {
    if (now.current === key) return;
    release();
    now.current = key;
    setPressed(key);
    onPress?.(key);
  };

  const isHeld = pressed !== undefined;
  const releaseNow = useRef(release);
  useEffect(() => {
    releaseNow.current = release;
  });
  useEffect(() => {
    if (!isHeld) return undefined;
    // The pointer may be let go anywhere, the window may lose the keyboard while a key is down.
    const end = () => releaseNow.current();
    const ends = ['pointerup', 'pointercancel', 'blur'] as const;
    ends.forEach((name) => window.addEventListener(name, end));
    return () => ends.forEach((name) => window.removeEventListener(name, end));
  }, [isHeld]);
  useEffect(() => () => releaseNow.current(), []);

  const move = (event: KeyboardEvent<SVGGElement>, to: number) => {
    event.preventDefault();
    const key = keys[Math.min(keys.length - 1, Math.max(0, to))];
    if (key === undefined) return;
    setReachable(key);
    (
      event.currentTarget.parentElement?.querySelector(
        `[data-voice="${CSS.escape(key)}"]`,
      ) as SVGGElement | null
    )?.focus();
  };

  const handlersOf = (key: string) => ({
    tabIndex: key === (keys.includes(reachable ?? '') ? reachable : keys[0]) ? 0 : -1,
    onPointerDown: (event: PointerEvent<SVGGElement>) => {
      if (event.button !== 0) return;
      // A touch is bound to the first voice else, and no other one would see it pass.
      if (event.currentTarget.hasPointerCapture(event.pointerId))
        event.currentTarget.releasePointerCapture(event.pointerId);
      setReachable(key);
      press(key);
    },
    onPointerEnter: (event: PointerEvent<SVGGElement>) => {
      if (event.buttons === 1 && now.current !== undefined) press(key);
    },
    onKeyDown: (event: KeyboardEvent<SVGGElement>) => {
      const at = keys.indexOf(key);
      if (event.key === 'ArrowRight') move(event, at + 1);
      else if (event.key === 'ArrowLeft') move(event, at - 1);
      else if (event.key === 'Home') move(event, 0);
      else if (event.key === 'End') move(event, keys.length - 1);
      else if (event.key === ' ' || event.key === 'Enter') {
        event.preventDefault();
        if (!event.repeat) press(key);
      }
    },
    onKeyUp: (event: KeyboardEvent<SVGGElement>) => {
      if (event.key === ' ' || event.key === 'Enter') release();
    },
    onBlur: release,
  });

  return { pressed, handlersOf };
}
