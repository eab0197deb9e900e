package plumbray.imaging.rectify;

import java.util.ArrayList;
import java.util.List;

/** Where the pixels of one output row come from: spans from left to right, without gaps. */
final class RowSpans {
  private final List<Span> spans = new ArrayList<>();
  private int count;

  void clear() {
    count = 0;
  }

  /** A further span, to be filled in. */
  Span add(int from, int to, int code) {
    if (count == spans.size()) {
      spans.add(new Span());
    }
    Span span = spans.get(count++);
    span.from = from;
    span.to = to;
    span.code = code;
    return span;
  }

  void dropLast() {
    count--;
  }

  int count() {
    return count;
  }

  Span get(int i) {
    return spans.get(i);
  }
}
