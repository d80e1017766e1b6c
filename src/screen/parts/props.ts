import { noChange } from "lit";
import { Directive, directive, type ElementPart, type PartInfo, PartType } from "lit/directive.js";

/** CSS property → value; null takes it away. */
export type Props = { readonly [name: string]: string | null };

/**
 * Sets style properties through CSSOM, which the page's security policy allows; a `style` attribute it refuses.
 * Written into the tag itself: `<div ${props({ left: "3px" })}>`.
 */
class PropsDirective extends Directive {
  constructor(part: PartInfo) {
    super(part);
    if (part.type !== PartType.ELEMENT) throw new Error("props goes into a tag, not an attribute");
  }
  render(_props: Props): typeof noChange {
    return noChange;
  }
  override update(part: ElementPart, [given]: [Props]): typeof noChange {
    const { style } = part.element as HTMLElement;
    for (const [name, value] of Object.entries(given)) {
      if (value === null) style.removeProperty(name);
      else if (style.getPropertyValue(name) !== value) style.setProperty(name, value);
    }
    return noChange;
  }
}

export const props = directive(PropsDirective);
