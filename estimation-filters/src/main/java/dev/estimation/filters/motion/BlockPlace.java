package dev.estimation.filters.motion;

import dev.estimation.filters.model.Motion;
import dev.estimation.filters.model.NoiseDrivenMotion;

/**
 * Where a block lies in the whole.
 *
 * @param storageStart first number of its state
 * @param start first dimension of its state
 * @param controlStart first of its controls
 * @param noiseStart first of its noise components
 * @param storage numbers of its state
 * @param dimension of its state
 * @param controls its number of controls
 * @param noises its number of noise components; 0 if noise is added
 */
record BlockPlace(
    int storageStart,
    int start,
    int controlStart,
    int noiseStart,
    int storage,
    int dimension,
    int controls,
    int noises) {
  static final BlockPlace ORIGIN = new BlockPlace(0, 0, 0, 0, 0, 0, 0, 0);

  /** The place of a block right behind this one. */
  BlockPlace next(Motion block) {
    return new BlockPlace(
        storageStart + storage,
        start + dimension,
        controlStart + controls,
        noiseStart + noises,
        block.stateSpace().storage(),
        block.stateSpace().dimension(),
        block.controlDimension(),
        block instanceof NoiseDrivenMotion driven ? driven.noiseDimension() : 0);
  }

  /** The input of the whole, with states of a total dimension before all noise, that is an input of the block. */
  int input(int ofBlock, int total) {
    return ofBlock < dimension ? start + ofBlock : total + noiseStart + ofBlock - dimension;
  }
}
