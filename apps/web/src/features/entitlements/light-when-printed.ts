import { useEffect } from 'react';

/** Paper is white: a dark page is printed in its light colours, and is dark again afterwards. */
export function useLightWhenPrinted(): void {
  useEffect(() => {
    const page = document.documentElement;
    let wasDark = false;
    const before = () => {
      wasDark = page.classList.contains('dark');
      if (wasDark) page.classList.replace('dark', 'light');
    };
    const after = () => {
      if (wasDark) page.classList.replace('light', 'dark');
    };
    addEventListener('beforeprint', before);
    addEventListener('afterprint', after);
    return () => {
      removeEventListener('beforeprint', before);
      removeEventListener('afterprint', after);
    };
  }, []);
}
