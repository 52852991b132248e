/** Masthead, bars, sheets, menus, tabs and tables. */
export const frameCss = `
.r-wordmark { display: flex; align-items: center; gap: 12px; min-height: 44px; color: var(--ink); text-decoration: none; }
.r-masthead-places { display: flex; gap: clamp(20px, 3vw, 40px); }
.r-top { background: var(--page); }
.r-anchor { position: relative; display: inline-flex; }
/* Every box around an open popover rises above what follows it. */
:root div:has(.r-popover) { z-index: 30; }
.r-words-button { min-height: 44px; min-width: 44px; margin: 0; padding: 0; border: 0; background: none; color: var(--ink-muted);
  font-family: var(--reading); font-size: 16px; line-height: 24px; cursor: pointer; white-space: nowrap; }
.r-words-button:hover { color: var(--ink); }
.r-tab-count { font-family: var(--number); font-size: 14px; }
.r-masthead { position: sticky; top: 0; z-index: 20; background: var(--page); }
.r-place { position: relative; display: flex; align-items: center; justify-content: center; gap: 6px; box-sizing: border-box;
  color: var(--ink-muted); text-decoration: none; font-family: var(--reading); font-size: 16px; line-height: 24px; white-space: nowrap; }
.r-place:hover { color: var(--ink); }
.r-place[aria-current="page"] { color: var(--ink); font-family: var(--semibold); }
.r-place-count { font-family: "Iosevka Semibold", var(--number); font-size: 13px; color: var(--ochre); }
.r-masthead .r-place { height: 64px; }
.r-masthead .r-place[aria-current="page"]::after { content: ""; position: absolute; left: 0; right: 0; bottom: 0; height: 4px;
  background: var(--ink); }
.r-places { position: fixed; left: 0; right: 0; bottom: 0; z-index: 20; display: grid; grid-auto-flow: column; grid-auto-columns: 1fr;
  height: 56px; padding-bottom: env(safe-area-inset-bottom, 0px); background: var(--page); border-top: 1px solid var(--hairline); }
.r-places .r-place { height: 56px; font-size: 15px; }
.r-places .r-place[aria-current="page"]::after { content: ""; position: absolute; left: 12%; right: 12%; top: -1px; height: 3px;
  background: var(--ink); }
.r-strip { position: fixed; left: 0; right: 0; bottom: calc(56px + env(safe-area-inset-bottom, 0px)); z-index: 19; display: flex; gap: 8px;
  box-sizing: border-box; height: 56px; padding: 6px 16px; background: var(--page); border-top: 1px solid var(--hairline); }
.r-strip > * { flex: 1 1 0; min-width: 0; }
.r-strip > .r-filled { flex: 2 1 0; }
.r-strip .r-anchor > .r-button { width: 100%; }
.r-strip .r-button { padding-left: 6px; padding-right: 6px; white-space: nowrap; }
:root[data-typing] .r-strip, :root[data-typing] .r-places { display: none; }
.r-veil { position: fixed; inset: 0; z-index: 50; display: flex; flex-direction: column; justify-content: flex-end;
  background: color-mix(in srgb, var(--page) 72%, transparent); }
.r-sheet { box-sizing: border-box; width: 100%; max-height: 92vh; max-height: 92dvh; overflow: auto; background: var(--card);
  border-top: 2px solid var(--ink); }
.r-veil.r-centred { justify-content: center; align-items: center; padding: 32px; }
.r-veil.r-centred .r-sheet { width: auto; min-width: 400px; max-width: min(720px, 100%); border: 1px solid var(--staff);
  border-top: 2px solid var(--ink); border-radius: 3px; }
.r-sheet-foot { position: sticky; bottom: 0; display: flex; gap: 8px; padding: 12px 16px 16px; background: var(--card); }
.r-sheet-foot > * { flex: 1 1 0; }
.r-sheet-foot > .r-filled { flex: 2 1 0; }
.r-popover { position: absolute; top: calc(100% + 4px); z-index: 40; box-sizing: border-box; min-width: 200px; max-width: calc(100vw - 32px); padding: 8px 0;
  background: var(--card); border: 1px solid var(--staff); border-radius: 3px; }
.r-item { box-sizing: border-box; display: flex; width: 100%; min-height: 44px; align-items: center; justify-content: space-between; gap: 16px;
  margin: 0; padding: 6px 16px; border: 0; background: none; color: var(--ink); font-family: var(--reading); font-size: 16px; line-height: 24px;
  text-align: left; text-decoration: none; cursor: pointer; }
.r-item:hover, .r-item:focus-visible { background: var(--well); }
.r-item + .r-item, .r-item-rule { box-shadow: inset 0 1px 0 var(--hairline); }
.r-item small { font-size: 14px; color: var(--ink-muted); }
.r-item[aria-disabled="true"] { color: var(--ink-faint); cursor: not-allowed; }
.r-tabs { display: flex; flex-wrap: wrap; gap: 0 24px; border-bottom: 1px solid var(--hairline); }
.r-tab { position: relative; min-height: 44px; margin: 0 0 -1px; padding: 8px 0; border: 0; background: none; color: var(--ink-muted);
  font-family: var(--reading); font-size: 16px; line-height: 24px; cursor: pointer; }
.r-tab:hover { color: var(--ink); }
.r-tab[aria-selected="true"] { color: var(--ink); font-family: var(--semibold); box-shadow: inset 0 -3px 0 var(--ink); }
.r-table { border-collapse: collapse; width: 100%; color: var(--ink); font-family: var(--reading); font-size: 16px; line-height: 24px; }
.r-table caption { text-align: left; font-size: 14px; line-height: 20px; color: var(--ink-muted); padding: 0 0 8px; }
.r-table th { padding: 4px 16px 4px 0; text-align: left; font-family: var(--reading); font-size: 14px; font-weight: 400; color: var(--ink-muted);
  font-variant-caps: all-small-caps; letter-spacing: 0.06em; border-bottom: 1px solid var(--hairline); vertical-align: bottom; }
.r-table td { padding: 4px 16px 4px 0; vertical-align: baseline; }
.r-table.r-ruled td { border-bottom: 1px solid var(--hairline); padding-top: 9px; padding-bottom: 9px; }
.r-table .r-right { text-align: right; }
.r-table .r-mono { font-family: var(--number); white-space: nowrap; }
.r-table tr[aria-current="true"] td { background: var(--card); box-shadow: inset 0 2px 0 var(--indigo), inset 0 -2px 0 var(--indigo); }
.r-table tr[data-selectable] { cursor: pointer; }
.r-cell-button { margin: 0; padding: 0; border: 0; background: none; color: inherit; font: inherit; cursor: pointer; }
.r-cells { display: grid; grid-template-columns: auto 1fr; gap: 2px 16px; margin: 0 -8px; padding: 12px 8px; border-bottom: 1px solid var(--hairline);
  font-family: var(--reading); font-size: 16px; line-height: 24px; color: var(--ink); }
.r-cells dt { color: var(--ink-muted); font-size: 14px; }
.r-cells dd { margin: 0; text-align: right; overflow-wrap: anywhere; }
.r-cells dd.r-mono { font-family: var(--number); }
.r-cells[data-selected="true"] { background: var(--card); box-shadow: inset 0 0 0 2px var(--indigo); }
.r-row { position: relative; display: flex; align-items: center; gap: 20px; height: 56px; border-bottom: 1px solid var(--hairline); }
.r-row::before { content: ""; position: absolute; z-index: -1; inset: 0 -16px; background: var(--card); border-left: 3px solid var(--verdigris);
  opacity: 0; }
.r-link:hover > .r-row::before, .r-link:focus-visible > .r-row::before, .r-row[data-selected]::before { opacity: 1; }
.r-link.r-whole { position: relative; z-index: 0; }
.r-card { box-sizing: border-box; padding: 15px; background: var(--card); border: 1px solid var(--hairline); border-radius: 3px;
  display: flex; flex-direction: column; gap: 4px; }
.r-link:hover > .r-card { border-color: var(--staff); }
.r-card[data-selected] { border-color: var(--verdigris); box-shadow: inset 3px 0 0 var(--verdigris); }
/* A column that stays while the page scrolls beside it, and scrolls by itself when it is longer than the window. */
.r-side { position: sticky; top: 71px; flex: none; box-sizing: border-box; max-height: calc(100vh - 71px); max-height: calc(100dvh - 71px);
  margin-top: -24px; padding: 24px 0; overflow-y: auto; overscroll-behavior: contain; scrollbar-width: thin; }
.r-side.r-queue { box-sizing: content-box; margin-left: -16px; margin-right: -16px; padding-left: 16px; padding-right: 16px; }
.r-queue-item { box-sizing: border-box; position: relative; z-index: 0; display: flex; flex-direction: column; gap: 4px; padding: 8px 0;
  border-top: 1px solid var(--hairline); color: var(--ink); text-decoration: none; }
.r-queue-item::before { content: ""; position: absolute; z-index: -1; inset: 0 -12px; border-left: 3px solid var(--staff); background: var(--card);
  opacity: 0; }
.r-queue-item:hover::before, .r-queue-item:focus-visible::before, .r-queue-item[aria-current="page"]::before { opacity: 1; }
.r-queue-item[aria-current="page"]::before { border-left-color: var(--ink); }
.r-queue-line { display: flex; flex-wrap: wrap; justify-content: space-between; align-items: baseline; column-gap: 16px; }
.r-columns { columns: 2 280px; column-gap: 32px; }
.r-columns > * { break-inside: avoid; }
`;
