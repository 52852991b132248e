// Before the first paint: the theme that was chosen on this device, so that no page flashes in the other one.
try {
  const chosen = localStorage.getItem('ritornel.theme');
  if (chosen === 'sheet' || chosen === 'plate') document.documentElement.dataset.theme = chosen;
} catch {
  // A browser that keeps nothing shows the theme of the device.
}
