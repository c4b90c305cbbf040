/** Attributes of an element; numbers are written to a hundredth. */
export type ChartAttributes = Readonly<Record<string, string | number>>;

/**
 * Writes an element of an SVG chart as text.
 *
 * @param name       the element's name
 * @param attributes in order; values are escaped
 * @param children   markup, as this function gives it
 */
export function chartElement(name: string, attributes: ChartAttributes, ...children: readonly string[]): string {
  const written = Object.entries(attributes)
    .map(([key, value]) => ` ${key}="${typeof value === "number" ? chartNumber(value) : escaped(value)}"`)
    .join("");
  return children.length === 0 ? `<${name}${written}/>` : `<${name}${written}>${children.join("")}</${name}>`;
}

/** Writes text inside a chart; the result is markup. */
export function chartText(words: string, x: number, y: number, attributes: ChartAttributes = {}): string {
  return chartElement("text", { x, y, ...attributes }, escaped(words));
}

/** Writes words as the content of an element. */
export function escaped(words: string): string {
  return words.replaceAll("&", "&amp;").replaceAll("<", "&lt;").replaceAll(">", "&gt;").replaceAll('"', "&quot;");
}

/** Writes a coordinate, to a hundredth. */
export function chartNumber(value: number): string {
  return String(Math.round(value * 100) / 100);
}
