package plumbray.published;

import java.util.ArrayList;
import java.util.List;
import java.util.function.DoubleSupplier;

/** Collects the checks of one topic; source and unit hold until they are set anew. */
final class Topic {

  private final String name;
  private final List<PublishedCheck> checks = new ArrayList<>();
  private PublishedCheck.Source source;
  private String unit = "";

  Topic(String name) {
    this.name = name;
  }

  Topic from(String citation, PublishedCheck.Kind kind) {
    source = new PublishedCheck.Source(citation, kind);
    return this;
  }

  Topic in(String unitOfTheNumbers) {
    unit = unitOfTheNumbers;
    return this;
  }

  Topic check(String what, double published, double tolerance, DoubleSupplier ours) {
    checks.add(new PublishedCheck(name, what, unit, published, tolerance, source, ours));
    return this;
  }

  List<PublishedCheck> checks() {
    return List.copyOf(checks);
  }
}
