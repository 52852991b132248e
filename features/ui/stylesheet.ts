import { baseCss } from './base-css';
import { controlCss } from './control-css';
import { frameCss } from './frame-css';
import { applyThemeChoice } from './theme-choice';

const ID = 'ritornel';

/** Put the stylesheet and the chosen theme in place, once. */
function installStylesheet(): void {
  if (typeof document === 'undefined' || document.getElementById(ID)) return;
  const sheet = document.createElement('style');
  sheet.id = ID;
  sheet.textContent = `${baseCss}${controlCss}${frameCss}`;
  document.head.append(sheet);
  applyThemeChoice();
}

// Runs when the first component is imported: nothing is drawn without its colours.
installStylesheet();
