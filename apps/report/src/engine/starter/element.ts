// Makes elements from a name, attributes and what they hold; text is always text.

export type Content = Node | string;

/**
 * @param attributes `true` sets one without a value, `undefined` leaves it out
 */
export function element<K extends keyof HTMLElementTagNameMap>(
  name: K,
  attributes: Readonly<Record<string, string | true | undefined>> = {},
  ...content: readonly Content[]
): HTMLElementTagNameMap[K] {
  const made = document.createElement(name);
  for (const [key, value] of Object.entries(attributes))
    if (value !== undefined) made.setAttribute(key, value === true ? '' : value);
  made.append(...content);
  return made;
}

export function button(text: string, act: () => void): HTMLButtonElement {
  const made = element('button', { type: 'button' }, text);
  made.addEventListener('click', act);
  return made;
}
