const PAINTS = ['fill', 'stroke'] as const;

/** Write computed colours in place of the theme's variables, so that the file stands alone. */
function resolvePaint(original: Element, copy: Element): void {
  const style = getComputedStyle(original);
  for (const paint of PAINTS) {
    const value = style.getPropertyValue(paint);
    if (value) copy.setAttribute(paint, value);
  }
  if (copy instanceof SVGElement && copy.style.stroke) copy.style.stroke = style.stroke;
  if (copy instanceof SVGElement && copy.style.fill) copy.style.fill = style.fill;
  const children = [...original.children];
  children.forEach((child, i) => {
    const twin = copy.children[i];
    if (twin) resolvePaint(child, twin);
  });
}

/** The text of an SVG file of a picture, on the page's ground. */
function svgText(picture: SVGSVGElement): string {
  const copy = picture.cloneNode(true) as SVGSVGElement;
  resolvePaint(picture, copy);
  copy.setAttribute('xmlns', 'http://www.w3.org/2000/svg');
  copy.removeAttribute('aria-hidden');
  copy.style.background = getComputedStyle(document.body).backgroundColor;
  return new XMLSerializer().serializeToString(copy);
}

/** Save a picture as an SVG file. */
export function saveSvg(picture: SVGSVGElement, fileName: string): void {
  const address = URL.createObjectURL(new Blob([svgText(picture)], { type: 'image/svg+xml' }));
  const link = document.createElement('a');
  link.href = address;
  link.download = fileName;
  link.click();
  URL.revokeObjectURL(address);
}
