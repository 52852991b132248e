import { createElement, type ReactNode } from 'react';

/** Presentation elements that formulas are made of; everything else is left out with what it holds. */
const ELEMENTS = new Set(
  (
    'math mrow mi mn mo mtext mspace mfrac msqrt mroot msup msub msubsup mover munder munderover mtable mtr mtd ' +
    'mpadded mphantom mstyle mfenced'
  ).split(' '),
);
const ATTRIBUTES = new Set(
  (
    'display mathvariant stretchy fence separator lspace rspace form accent accentunder columnalign rowspacing ' +
    'columnspacing displaystyle scriptlevel width height depth linethickness minsize maxsize symmetric largeop movablelimits'
  ).split(' '),
);

function attributesOf(element: Element): Record<string, string> {
  return Object.fromEntries(
    [...element.attributes].filter(({ name }) => ATTRIBUTES.has(name)).map(({ name, value }) => [name, value]),
  );
}

function elementOf(node: Node, key: number): ReactNode {
  // A letter and its dot apart: the text face draws the dot over the letter, and has no letter with a dot of its own.
  if (node.nodeType === Node.TEXT_NODE) return node.textContent?.normalize('NFD');
  if (!(node instanceof Element) || !ELEMENTS.has(node.localName)) return null;
  const children = [...node.childNodes].map(elementOf);
  return createElement(node.localName, { key, ...attributesOf(node) }, ...children);
}

/** MathML as elements, known ones only; null when it cannot be read. */
export function mathmlElements(source: string): ReactNode {
  const parsed = new DOMParser().parseFromString(source, 'application/xml');
  const root = parsed.documentElement;
  return root.localName === 'math' ? elementOf(root, 0) : null;
}
