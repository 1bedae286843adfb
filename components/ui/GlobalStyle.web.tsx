import { useEffect } from 'react';
import { fontFamily, stroke } from './tokens';
import { useLook } from './useLook';

/** What only a page has: ground, scroll bars, focus ring, the browser's own filling of fields. */
export function GlobalStyle() {
  const { colours, theme } = useLook();
  useEffect(() => {
    const sheet = document.createElement('style');
    sheet.textContent = `
html,body,#root{height:100%;background:${colours.gap}}
html{color-scheme:${theme};-webkit-text-size-adjust:100%}
body{overflow:hidden;-webkit-font-smoothing:antialiased;font-family:${fontFamily.text},sans-serif}
*{scrollbar-width:thin;scrollbar-color:${colours.rule} transparent}
:focus{outline:none}
:focus-visible{outline:${stroke.focus}px solid ${colours.ink0} !important;outline-offset:${stroke.focusOffset}px;z-index:2}
input:focus-visible,textarea:focus-visible,select:focus-visible{outline-offset:0}
input:-webkit-autofill,input:-webkit-autofill:focus{-webkit-text-fill-color:${colours.ink0};box-shadow:0 0 0 100px ${colours.well} inset;caret-color:${colours.ink0}}
a{text-decoration:none;color:inherit}
@media (prefers-reduced-motion:reduce){*{animation:none !important;transition:none !important}}
`;
    document.head.appendChild(sheet);
    const named = document.querySelector<HTMLMetaElement>('meta[name="theme-color"]') ?? document.createElement('meta');
    named.name = 'theme-color';
    named.content = colours.gap;
    document.head.appendChild(named);
    return () => sheet.remove();
  }, [colours, theme]);
  return null;
}
