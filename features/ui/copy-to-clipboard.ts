/** Put text on the clipboard; false when the browser refuses. */
export async function copyToClipboard(text: string): Promise<boolean> {
  try {
    await navigator.clipboard.writeText(text);
    return true;
  } catch {
    return copyThroughSelection(text);
  }
}

/** The older way, for pages that are not served over a secure connection. */
function copyThroughSelection(text: string): boolean {
  const area = document.createElement('textarea');
  area.value = text;
  area.style.position = 'fixed';
  area.style.opacity = '0';
  document.body.append(area);
  area.select();
  try {
    // eslint-disable-next-line @typescript-eslint/no-deprecated -- the only way on pages without a secure connection
    return document.execCommand('copy');
  } catch {
    return false;
  } finally {
    area.remove();
  }
}
