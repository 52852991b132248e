import { themeColours } from './theme-colours';

const declare = (colours: Record<string, string>, scheme: 'light' | 'dark'): string =>
  [`color-scheme: ${scheme};`, ...Object.entries(colours).map(([name, value]) => `--${name}: ${value};`)].join(' ');

const sheet = declare(themeColours.sheet, 'light');
const plate = declare(themeColours.plate, 'dark');

/** Themes, document, focus, motion and print. */
export const baseCss = `
:root { ${sheet} --reading: Brygada, Iosevka, Georgia, serif; --italic: "Brygada Italic", Iosevka, Georgia, serif;
  --semibold: "Brygada Semibold", Iosevka, Georgia, serif; --number: Iosevka, ui-monospace, monospace; }
@media (prefers-color-scheme: dark) { :root { ${plate} } }
:root[data-theme="sheet"] { ${sheet} }
:root[data-theme="plate"] { ${plate} }
html, body { height: auto; min-height: 100%; overflow: visible; margin: 0; background: var(--page); color: var(--ink);
  font-family: var(--reading); font-synthesis: none; -webkit-text-size-adjust: 100%; text-size-adjust: 100%; }
body { overflow-x: clip; }
#root { display: flex; flex-direction: column; height: auto; min-height: 100vh; min-height: 100dvh; }
html { scroll-padding: 80px 0 136px; }
* { font-synthesis: none; }
svg { display: block; flex: none; }
.r-math { max-width: 100%; overflow-x: auto; font-family: var(--reading); padding: 4px 0 4px 8px; }
.r-math math { display: block math; width: max-content; margin: 0; font-family: var(--reading); }
.r-math mi { font-family: var(--italic); text-transform: none; }
.r-math mtd { padding: 3px 4px; text-align: center; }
.r-math mtd:first-child { padding-left: 0; text-align: right; }
.r-math mtd:last-child { text-align: left; }
::selection { background: var(--verdigris); color: var(--page); }
:root :focus { outline: none; }
:root :focus-visible { outline: 2px solid var(--indigo); outline-offset: 2px; border-radius: 3px; }
:root [role="heading"]:focus-visible, :root h1:focus-visible, :root h2:focus-visible, :root h3:focus-visible,
:root main:focus-visible { outline: none; }
.r-hidden { position: absolute; width: 1px; height: 1px; margin: -1px; padding: 0; overflow: hidden; clip-path: inset(50%);
  white-space: nowrap; border: 0; }
.r-skip { position: absolute; left: 16px; top: -80px; z-index: 100; padding: 12px 16px; background: var(--card); color: var(--indigo);
  border: 1px solid var(--indigo); border-radius: 3px; font-family: var(--reading); font-size: 16px; }
.r-skip:focus { top: 8px; }
@keyframes r-beat { 0%, 10% { transform: translateX(0); } 20%, 35% { transform: translateX(25%); }
  45%, 60% { transform: translateX(50%); } 70%, 85% { transform: translateX(75%); } 100% { transform: translateX(0); } }
.r-beat { opacity: 0; animation: r-beat 4s steps(1, end) 400ms infinite, r-appear 1ms linear 400ms forwards; }
@keyframes r-appear { to { opacity: 1; } }
@keyframes r-draw { from { opacity: 0; transform: scaleY(0.2); } to { opacity: 1; transform: none; } }
.r-draw { animation: r-draw 240ms ease-out both; transform-box: fill-box; transform-origin: center; }
@media (prefers-reduced-motion: reduce) {
  *, *::before, *::after { animation-duration: 1ms !important; animation-iteration-count: 1 !important;
    transition-duration: 1ms !important; scroll-behavior: auto !important; }
  .r-beat { animation: r-appear 1ms linear 400ms forwards !important; }
}
@media print {
  :root, :root[data-theme] { ${sheet} --page: #fff; --well: #fff; --ink: #000; --ink-muted: #000; --ink-faint: #333; }
  .r-noprint, [role="banner"], header.r-masthead, nav, .r-strip, .r-places { display: none !important; }
  main { padding: 0 !important; max-width: none !important; }
  .r-card, .r-row, tr, figure { break-inside: avoid; }
  @page { margin: 16mm; }
}
`;
