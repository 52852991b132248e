/** Buttons, links, fields and choices. */
export const controlCss = `
.r-label { display: block; margin: 0 0 6px; padding: 0; color: var(--ink-muted); font-family: var(--reading); font-size: 14px; line-height: 20px; }
.r-label i, .r-chip i { font-family: var(--italic); font-style: normal; }
.r-chip b.r-mono { font-family: var(--number); }
.r-optional { color: var(--ink-faint); }
.r-field { position: relative; display: flex; align-items: center; }
.r-trailing { position: absolute; right: 12px; max-width: 60%; overflow: hidden; white-space: nowrap; color: var(--ink-faint);
  font-family: var(--reading); font-size: 14px; line-height: 24px; padding: 10px 0; }
.r-group { min-width: 0; margin: 0; padding: 0; border: 0; }
.r-inline { display: inline-flex; flex-wrap: wrap; gap: 0 8px; }
.r-inline .r-inline-choice + .r-inline-choice::before { content: "·"; margin-right: 8px; }
.r-choice-label { flex: 1; cursor: pointer; }
.r-choice-label.r-ink { color: var(--ink); }
.r-radio:checked ~ .r-choice-label { color: var(--ink); font-family: var(--semibold); }
.r-choice-hint { padding-left: 26px; color: var(--ink-muted); font-family: var(--reading); font-size: 14px; line-height: 20px; }
.r-choice-error { color: var(--oxide); }
.r-radio-row { padding: 8px 0 10px; border-top: 1px solid var(--hairline); }
.r-chip-words { padding: 0 4px 0 10px; }
.r-chip b, .r-chip-words b { font-weight: inherit; color: var(--ink); }
.r-link { color: var(--indigo); text-decoration: underline; text-decoration-thickness: 1px; text-underline-offset: 4px; cursor: pointer;
  background: none; border: 0; padding: 0; margin: 0; font: inherit; text-align: inherit; display: inline; }
.r-link:hover { text-decoration-thickness: 2px; }
.r-link.r-plain { text-decoration: none; }
.r-link.r-plain:hover { text-decoration: underline; }
.r-link.r-whole { display: block; color: inherit; text-decoration: none; }
.r-link.r-target { position: relative; }
.r-link.r-target::after { content: ""; position: absolute; inset: 50% 50%; width: max(100%, 44px); height: 44px;
  transform: translate(-50%, -50%); }
.r-link[aria-disabled="true"] { color: var(--ink-faint); cursor: not-allowed; }
.r-reading { font-family: var(--reading); font-size: 16px; line-height: 24px; }
.r-small { font-size: 14px; line-height: 20px; }
.r-button { box-sizing: border-box; display: inline-flex; align-items: center; justify-content: center; gap: 8px; min-height: 44px;
  padding: 8px 16px; margin: 0; border: 1px solid var(--staff); border-radius: 3px; background: transparent; color: var(--ink);
  font-family: var(--semibold); font-size: 16px; line-height: 24px; text-decoration: none; text-align: center; cursor: pointer; }
.r-button:hover { border-color: var(--ink); }
.r-button:active { background: var(--well); }
.r-button.r-quiet { font-family: var(--reading); }
.r-button.r-filled { background: var(--verdigris); border-color: var(--verdigris); color: var(--page); }
.r-button.r-filled:hover { border-color: var(--ink); }
.r-button.r-filled:active { background: var(--ink); border-color: var(--ink); }
.r-button.r-wide { display: flex; width: 100%; padding-left: 8px; padding-right: 8px; }
.r-button[aria-disabled="true"], .r-button[aria-disabled="true"]:hover, .r-button[aria-disabled="true"]:active {
  background: transparent; border: 1px dashed var(--staff); color: var(--ink-faint); cursor: not-allowed; }
.r-kbd { font-family: var(--number); font-size: 13px; color: var(--ink-muted); }
.r-input { box-sizing: border-box; display: block; width: 100%; min-height: 44px; margin: 0; padding: 8px 12px; border: 0;
  border-bottom: 1px solid var(--staff); border-radius: 3px 3px 0 0; background: var(--well); color: var(--ink);
  font-family: var(--reading); font-size: 16px; line-height: 24px; appearance: none; }
.r-input.r-mono { font-family: var(--number); }
.r-input.r-large { font-size: 19px; min-height: 48px; }
.r-input::placeholder { color: var(--ink-faint); opacity: 1; }
.r-input[aria-invalid="true"] { border-bottom: 2px solid var(--oxide); }
.r-input:disabled, .r-input[readonly] { color: var(--ink-muted); }
.r-input::-webkit-search-cancel-button { display: none; }
textarea.r-input { resize: vertical; min-height: 96px; }
select.r-input { padding-right: 36px; font-family: var(--reading); background-image: linear-gradient(45deg, transparent 50%, var(--ink-muted) 50%),
  linear-gradient(-45deg, transparent 50%, var(--ink-muted) 50%); background-size: 6px 6px; background-repeat: no-repeat;
  background-position: right 18px center, right 12px center; cursor: pointer; }
select.r-input.r-compact { min-height: 32px; padding: 2px 24px 2px 10px; background-position: right 12px center, right 6px center; }
@media (pointer: coarse) { select.r-input.r-compact { min-height: 44px; } }
.r-turn { color: var(--ink-muted); }
.r-check { box-sizing: border-box; flex: none; width: 16px; height: 16px; margin: 4px 0 0; border: 1px solid var(--staff);
  border-radius: 2px; background: transparent; appearance: none; cursor: pointer; }
.r-check:checked { border-color: var(--verdigris); background: var(--verdigris); }
.r-check:checked::before { content: ""; display: block; width: 100%; height: 100%; background: var(--page);
  clip-path: polygon(14% 52%, 26% 40%, 42% 56%, 74% 22%, 86% 34%, 42% 80%); }
.r-radio { box-sizing: border-box; flex: none; width: 16px; height: 16px; margin: 4px 0 0; border: 1px solid var(--staff);
  border-radius: 50%; background: transparent; appearance: none; cursor: pointer; }
.r-radio:checked { border-color: var(--verdigris); background: radial-gradient(var(--verdigris) 0 5px, transparent 5.5px); }
.r-check:disabled, .r-radio:disabled { border-style: dashed; cursor: not-allowed; }
.r-choice { display: flex; align-items: flex-start; gap: 10px; min-height: 24px; padding: 2px 0; color: var(--ink-muted);
  font-family: var(--reading); font-size: 16px; line-height: 24px; cursor: pointer; }
@media (pointer: coarse) { .r-choice { padding: 10px 0; } }
.r-segments { display: flex; flex-wrap: wrap; gap: 8px; }
.r-segment { position: relative; flex: 1 1 auto; }
.r-segment input { position: absolute; inset: 0; width: 100%; height: 100%; margin: 0; opacity: 0; cursor: pointer; }
.r-segment span { box-sizing: border-box; display: flex; align-items: center; justify-content: center; min-height: 44px; padding: 4px 8px;
  border: 1px solid var(--staff); border-radius: 3px; color: var(--ink); font-family: var(--reading); font-size: 16px; white-space: nowrap; }
.r-segment input:checked + span { border: 2px solid var(--verdigris); padding: 3px 7px; color: var(--verdigris); font-family: var(--semibold); }
.r-segment input:focus-visible + span { outline: 2px solid var(--indigo); outline-offset: 2px; }
.r-inline-choice { position: relative; color: var(--ink-muted); font-family: var(--reading); font-size: 14px; line-height: 24px; }
.r-inline-choice input { position: absolute; inset: -10px -4px; margin: 0; opacity: 0; cursor: pointer; }
.r-inline-choice input:checked + span { color: var(--ink); font-family: var(--semibold); }
.r-inline-choice input:focus-visible + span { outline: 2px solid var(--indigo); outline-offset: 2px; }
.r-chip { display: inline-flex; align-items: center; min-height: 32px; margin: 6px 0; border: 1px solid var(--staff); border-radius: 3px;
  background: var(--card); font-family: var(--reading); font-size: 16px; color: var(--ink-muted); }
.r-chip.r-words { border-style: dashed; }
.r-chip button { font: inherit; color: inherit; background: none; border: 0; margin: 0; padding: 0 4px 0 10px; min-height: 30px;
  cursor: pointer; position: relative; }
.r-chip button b { font-weight: inherit; color: var(--ink); }
.r-chip button.r-remove { width: 32px; padding: 0; color: var(--ink-muted); font-family: var(--number); }
.r-chip button.r-remove::after { content: ""; position: absolute; inset: -7px -6px; }
.r-chip button:hover { color: var(--ink); }
.r-range { position: absolute; left: -8px; right: -8px; width: calc(100% + 16px); bottom: -8px; height: 24px; margin: 0; background: none;
  appearance: none; pointer-events: none; }
.r-range::-webkit-slider-runnable-track { background: none; }
.r-range::-moz-range-track { background: none; }
.r-range::-webkit-slider-thumb { appearance: none; width: 16px; height: 24px; border: 0; pointer-events: auto; cursor: ew-resize;
  background: linear-gradient(var(--verdigris), var(--verdigris)) center / 4px 16px no-repeat; }
.r-range::-moz-range-thumb { width: 16px; height: 24px; border: 0; border-radius: 0; pointer-events: auto; cursor: ew-resize;
  background: linear-gradient(var(--verdigris), var(--verdigris)) center / 4px 16px no-repeat; }
@media (pointer: coarse) { .r-range::-webkit-slider-thumb { height: 44px; } .r-range { height: 44px; bottom: -18px; } }
`;
