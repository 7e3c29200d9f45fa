package dev.estimation.core.function;

import static dev.estimation.testing.Agreement.assertNames;
import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertSame;
import static org.junit.jupiter.api.Assertions.assertThrows;

import java.util.Arrays;
import org.junit.jupiter.api.Test;

/** What a structure tells, and that it cannot be changed. */
class StructureTest {
  private static final Jacobian JACOBIAN = (input, given, jacobian) -> jacobian[0] = 1;
  private static final Hessian HESSIAN = (input, given, hessians) -> hessians[0] = 1;

  @Test
  void unknownReadsEverythingAndHasNoJacobian() {
    assertArrayEquals(new int[] {0, 1, 2}, Structure.UNKNOWN.activeInputs(3));
    assertFalse(Structure.UNKNOWN.jacobian().isPresent());
    assertFalse(Structure.UNKNOWN.hessian().isPresent());
    assertFalse(new OnlyValues().structure().jacobian().isPresent());
  }

  /** A function that says nothing of itself. */
  private static final class OnlyValues implements VectorFunction {
    @Override
    public void evaluate(double[] input, double[] given, double[] output) {
      output[0] = input[0];
    }
  }

  @Test
  void eachPartIsKeptWhenTheOtherIsAdded() {
    Structure first =
        Structure.UNKNOWN.withHessian(HESSIAN).withActiveInputs(4, 1).withJacobian(JACOBIAN);
    Structure second =
        Structure.UNKNOWN.withJacobian(JACOBIAN).withActiveInputs(4, 1).withHessian(HESSIAN);
    for (Structure structure : new Structure[] {first, second}) {
      assertArrayEquals(new int[] {4, 1}, structure.activeInputs(5), "in the order given");
      assertSame(JACOBIAN, structure.jacobian().orElseThrow());
      assertSame(HESSIAN, structure.hessian().orElseThrow());
    }
    Structure whole = first.withAllInputsActive();
    assertArrayEquals(new int[] {0, 1}, whole.activeInputs(2));
    assertSame(JACOBIAN, whole.jacobian().orElseThrow());
    assertSame(HESSIAN, whole.hessian().orElseThrow());
    assertArrayEquals(new int[] {4, 1}, first.activeInputs(5), "the first is as it was");
  }

  @Test
  void indicesOutOfRangeOrTwiceAreRefused() {
    assertRefused(5, 0, 5);
    assertRefused(5, -1, 2);
    assertRefused(5, 2, 3, 2);
    assertRefused(1, 1);
  }

  @Test
  void linearInputsAreKeptBesideTheOthers() {
    Structure first = Structure.UNKNOWN.withActiveInputs(4, 1, 0).withLinearInputs(0, 4);
    Structure second =
        Structure.UNKNOWN.withLinearInputs(0, 4).withJacobian(JACOBIAN).withActiveInputs(4, 1, 0);
    for (Structure structure : new Structure[] {first, second.withHessian(HESSIAN)}) {
      assertArrayEquals(new int[] {0, 4}, structure.linearInputs());
      assertArrayEquals(new int[] {1}, structure.nonlinearInputs(5));
      assertArrayEquals(new int[0], structure.withAllInputsActive().linearInputs());
      assertArrayEquals(new int[] {4, 1, 0}, structure.withLinearInputs().nonlinearInputs(5));
    }
    assertArrayEquals(new int[] {0, 1}, Structure.UNKNOWN.nonlinearInputs(2));
    int[] indices = {0};
    Structure copied = Structure.UNKNOWN.withLinearInputs(indices);
    indices[0] = 1;
    copied.linearInputs()[0] = 1;
    assertArrayEquals(new int[] {0}, copied.linearInputs());
  }

  @Test
  void aFunctionMustReadSomething() {
    assertThrows(IllegalArgumentException.class, () -> Structure.UNKNOWN.withActiveInputs());
  }

  private static void assertRefused(int dimension, int... indices) {
    Structure structure = Structure.UNKNOWN.withActiveInputs(indices);
    IllegalArgumentException refusal =
        assertThrows(IllegalArgumentException.class, () -> structure.activeInputs(dimension));
    assertNames(
        refusal.getMessage(),
        "active inputs",
        Integer.toString(dimension - 1),
        Arrays.toString(indices));
  }

  @Test
  void arraysAreCopied() {
    int[] indices = {2, 0};
    Structure structure = Structure.UNKNOWN.withActiveInputs(indices);
    indices[0] = 1;
    structure.activeInputs(3)[1] = 1;
    assertArrayEquals(new int[] {2, 0}, structure.activeInputs(3));
  }
}
