/** Properties that a saved figure carries on its elements, read from what the page shows. */
const CARRIED = [
  'fill',
  'fill-opacity',
  'stroke',
  'stroke-opacity',
  'stroke-width',
  'stroke-dasharray',
  'stroke-linejoin',
  'opacity',
  'paint-order',
  'font-family',
  'font-size',
  'font-weight',
  'text-anchor',
] as const;
const COLOURS = new Set<string>(['fill', 'stroke']);
const DROPPED = ['class', 'style', 'tabindex', 'role', 'aria-hidden', 'focusable'];

/**
 * The svg as a document of its own: every colour and font written out as a presentation attribute,
 * so that it looks the same in a program that knows nothing of this page. Elements marked
 * `data-export="no"` are left out.
 */
export function svgDocument(svg: SVGSVGElement, title: string): string {
  const copy = svg.cloneNode(true) as SVGSVGElement;
  carry(svg, copy);
  copy.querySelectorAll('[data-export="no"]').forEach((element) => element.remove());
  const name = document.createElementNS('http://www.w3.org/2000/svg', 'title');
  name.textContent = title;
  copy.prepend(name);
  copy.prepend(background(svg, copy));
  return `<?xml version="1.0" encoding="UTF-8"?>\n${new XMLSerializer().serializeToString(copy)}\n`;
}

function carry(shown: Element, copy: Element): void {
  const style = getComputedStyle(shown);
  const isText = copy.tagName === 'text' || copy.tagName === 'tspan';
  for (const property of CARRIED) {
    if (!copy.hasAttribute(property) && !(isText && OWNED_BY_TEXT.has(property))) continue;
    const value = style.getPropertyValue(property);
    if (value !== '')
      copy.setAttribute(property, COLOURS.has(property) ? plainColour(value) : value);
  }
  DROPPED.forEach((attribute) => copy.removeAttribute(attribute));
  Array.from(shown.children).forEach((child, index) => {
    const twin = copy.children[index];
    if (twin) carry(child, twin);
  });
}

/** Text takes these from the page or its group when it names none itself. */
const OWNED_BY_TEXT = new Set<string>(['font-family', 'font-size', 'fill']);

function background(svg: SVGSVGElement, copy: SVGSVGElement): SVGRectElement {
  const rect = document.createElementNS('http://www.w3.org/2000/svg', 'rect');
  rect.setAttribute('width', copy.getAttribute('width') ?? '100%');
  rect.setAttribute('height', copy.getAttribute('height') ?? '100%');
  rect.setAttribute(
    'fill',
    plainColour(getComputedStyle(svg).getPropertyValue('--paper') || '#ffffff'),
  );
  return rect;
}

/** A colour as #rrggbb (or rgba), which every program reads; the page may answer oklab(…) or color(…). */
function plainColour(colour: string): string {
  if (colour === 'none' || /^(#|rgb)/.test(colour.trim())) return colour.trim();
  const context = document.createElement('canvas').getContext('2d', { willReadFrequently: true });
  if (!context) return colour;
  context.fillStyle = colour;
  context.fillRect(0, 0, 1, 1);
  const [red = 0, green = 0, blue = 0, alpha = 255] = context.getImageData(0, 0, 1, 1).data;
  return alpha === 255
    ? `rgb(${red}, ${green}, ${blue})`
    : `rgba(${red}, ${green}, ${blue}, ${(alpha / 255).toFixed(3)})`;
}
