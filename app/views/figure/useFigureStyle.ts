import { type RefObject, useEffect, useLayoutEffect, useState } from 'react';
import { flushSync } from 'react-dom';
import type { FigureStyle } from '../../figures/figureStyle.ts';
import { paperStyle } from '../../figures/paperStyle.ts';

/** Colours and type of the page as they are now, for what cannot read them from the style sheet; null before the first look. */
export function useFigureStyle(element: RefObject<HTMLElement | null>): FigureStyle | null {
  const [style, setStyle] = useState<FigureStyle | null>(null);
  useLayoutEffect(() => {
    if (element.current !== null) setStyle(readFigureStyle(element.current));
  }, [element]);
  useEffect(() => {
    const read = () => {
      if (element.current === null) return;
      const next = readFigureStyle(element.current);
      // An equal style must stay the same object, or everything would be drawn again.
      setStyle((before) => (JSON.stringify(before) === JSON.stringify(next) ? before : next));
    };
    // The page is printed as it stands when the listener returns, so the new colours must be drawn before.
    const readAtOnce = () => flushSync(read);
    const dark = matchMedia('(prefers-color-scheme: dark)');
    const print = matchMedia('print');
    dark.addEventListener('change', read);
    print.addEventListener('change', readAtOnce);
    const attributes = new MutationObserver(read);
    attributes.observe(document.documentElement, {
      attributes: true,
      attributeFilter: ['class', 'data-theme', 'style'],
    });
    return () => {
      dark.removeEventListener('change', read);
      print.removeEventListener('change', readAtOnce);
      attributes.disconnect();
    };
  }, [element]);
  return style;
}

function readFigureStyle(element: HTMLElement): FigureStyle {
  // A property may hold any expression; only as the colour of something does it become a colour.
  const probe = document.createElement('span');
  element.append(probe);
  const colour = (name: string, fallback: string) => {
    probe.style.color = `var(${name}, ${fallback})`;
    return toHex(getComputedStyle(probe).color) ?? fallback;
  };
  const style: FigureStyle = {
    paper: colour('--paper', paperStyle.paper),
    ink: colour('--ink', paperStyle.ink),
    inkQuiet: colour('--ink-quiet', paperStyle.inkQuiet),
    rule: colour('--rule', paperStyle.rule),
    ruleStrong: colour('--rule-strong', paperStyle.ruleStrong),
    accent: colour('--accent', paperStyle.accent),
    forms: paperStyle.forms.map((fallback, index) => colour(`--form-${index + 1}`, fallback)),
    fontFamily: getComputedStyle(element).fontFamily,
  };
  probe.remove();
  return style;
}

/** Any colour that the browser can paint, as `#rrggbb`; null where it cannot. */
function toHex(colour: string): string | null {
  const canvas = document.createElement('canvas');
  canvas.width = 1;
  canvas.height = 1;
  const context = canvas.getContext('2d', { willReadFrequently: true });
  if (context === null) return null;
  context.fillStyle = colour;
  context.fillRect(0, 0, 1, 1);
  const [red, green, blue] = context.getImageData(0, 0, 1, 1).data;
  return `#${[red, green, blue].map((part) => part.toString(16).padStart(2, '0')).join('')}`;
}
