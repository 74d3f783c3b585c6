/** Children that are elements, by the qualified names that word processors write (w:p, m:oMath, …). */
export function childElements(element: Element): Element[] {
  const children: Element[] = []
  for (let node = element.firstChild; node; node = node.nextSibling)
    if (node.nodeType === 1) children.push(node as Element)
  return children
}

export function firstChild(element: Element, name: string): Element | null {
  return childElements(element).find((child) => child.nodeName === name) ?? null
}

export function valueOf(element: Element, attribute: string): string | null {
  return element.hasAttribute(attribute) ? element.getAttribute(attribute) : null
}

/** Puts others in an element's place, or takes it out. */
export function replaceBy(element: Element, others: readonly Node[]): void {
  const parent = element.parentNode
  if (!parent) return
  for (const other of others) parent.insertBefore(other, element)
  parent.removeChild(element)
}

/** A run of text, raised or lowered where told. */
export function appendRun(
  document: Document,
  text: string,
  level: 'superscript' | 'subscript' | null,
): Element {
  const run = document.createElement('w:r')
  if (level) {
    const properties = document.createElement('w:rPr')
    const vertical = document.createElement('w:vertAlign')
    vertical.setAttribute('w:val', level)
    properties.appendChild(vertical)
    run.appendChild(properties)
  }
  const content = document.createElement('w:t')
  content.setAttribute('xml:space', 'preserve')
  content.appendChild(document.createTextNode(text))
  run.appendChild(content)
  return run
}
