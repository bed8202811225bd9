/** Values that the document type gives to attributes which a tag leaves out (XML 1.0 §3.3.2). */
export class AttributeDefaults {
  private readonly byElement = new Map<string, Map<string, string>>();

  get isEmpty(): boolean {
    return this.byElement.size === 0;
  }

  /** The first declaration of an attribute is the one that holds (XML 1.0 §3.3). */
  declare(element: string, attribute: string, value: string): void {
    let values = this.byElement.get(element);
    if (!values) {
      values = new Map();
      this.byElement.set(element, values);
    }
    if (!values.has(attribute)) values.set(attribute, value);
  }

  of(element: string): ReadonlyMap<string, string> | undefined {
    return this.byElement.get(element);
  }
}
