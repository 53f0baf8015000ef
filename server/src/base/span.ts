// Half-open ranges of UTF-16 code units.

/** A half-open range `[start, end)` of UTF-16 code units. */
export interface Span {
  readonly start: number;
  readonly end: number;
}

/** True where the two spans share at least one code unit. */
export function overlaps(a: Span, b: Span): boolean {
  return a.start < b.end && b.start < a.end;
}

/** True where `inner` lies wholly in `outer`. */
export function contains(outer: Span, inner: Span): boolean {
  return outer.start <= inner.start && inner.end <= outer.end;
}

/** True where the offset lies in the span or touches its end, as a caret does. */
export function touches(span: Span, offset: number): boolean {
  return span.start <= offset && offset <= span.end;
}
