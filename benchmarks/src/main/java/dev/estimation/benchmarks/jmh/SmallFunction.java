package dev.estimation.benchmarks.jmh;

/** A function of a few inputs with its derivatives, which knows nothing of the state that it is a part of. */
interface SmallFunction {
  /** {@return the dimension of its input; a unit quaternion has 3} */
  int inputs();

  /** {@return the number of its outputs} */
  int outputs();

  /** {@return those inputs in which it is linear once the others are given} */
  int[] linearInputs();

  /** Fills z, which has at least {@link #outputs()} numbers. */
  void fill(double[] u, double[] z);

  /** Fills an array of zeros with dz_i / du_j at index i {@link #inputs()} + j. */
  void fillJacobian(double[] u, double[] jacobian);
}
