package dev.estimation.filters.testing;

import dev.estimation.core.gaussian.Form;
import dev.estimation.filters.filter.FilterPlan;
import org.junit.jupiter.params.Parameter;
import org.junit.jupiter.params.ParameterizedClass;
import org.junit.jupiter.params.provider.EnumSource;

/** Tests that hold in both forms, and run in both. */
@ParameterizedClass
@EnumSource(Form.class)
public abstract class BothForms {
  /** The form under test. */
  @Parameter
  protected Form form;

  /** A plan in the form under test. */
  protected final FilterPlan formed(FilterPlan plan) {
    return formed(plan, form);
  }

  /** A plan in a form. */
  public static FilterPlan formed(FilterPlan plan, Form form) {
    return form == Form.SQUARE_ROOT ? plan.inSquareRootForm() : plan;
  }
}
