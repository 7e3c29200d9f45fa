package dev.estimation.filters.motion;

import dev.estimation.core.function.Structure;
import dev.estimation.core.space.Space;
import dev.estimation.filters.model.Motion;
import java.util.ArrayList;
import java.util.List;
import java.util.stream.IntStream;

/** What all blocks have together, and the scratch for each if it belongs to one thread. */
final class BlockLayout {
  private final List<BlockPlace> places = new ArrayList<>();
  private final List<BlockScratch> own;
  private final Space space;
  private final Structure structure;

  BlockLayout(List<? extends Motion> blocks, boolean forOneThread) {
    if (blocks.isEmpty()) {
      throw new IllegalArgumentException("MotionBlocks wants 1 block or more, got none");
    }
    BlockPlace place = BlockPlace.ORIGIN;
    Space joined = null;
    for (Motion block : blocks) {
      place = place.next(block);
      places.add(place);
      joined = joined == null ? block.stateSpace() : joined.and(block.stateSpace());
    }
    this.space = joined;
    this.structure = Structure.UNKNOWN
        .withActiveInputs(inputs(blocks, true))
        .withLinearInputs(inputs(blocks, false));
    this.own = forOneThread ? newScratch() : List.of();
  }

  /** In the order of the whole, so that points do not depend on which block noise belongs to. */
  private int[] inputs(List<? extends Motion> blocks, boolean active) {
    IntStream.Builder joined = IntStream.builder();
    for (int k = 0; k < blocks.size(); k++) {
      BlockPlace place = places.get(k);
      Structure part = blocks.get(k).structure();
      int[] indices =
          active ? part.activeInputs(place.dimension() + place.noises()) : part.linearInputs();
      for (int index : indices) {
        joined.add(place.input(index, space.dimension()));
      }
    }
    return joined.build().sorted().toArray();
  }

  private List<BlockScratch> newScratch() {
    return places.stream().map(BlockScratch::new).toList();
  }

  /** One for each block: the thread's own, or new ones if the model is shared. */
  List<BlockScratch> scratch() {
    return own.isEmpty() ? newScratch() : own;
  }

  Space space() {
    return space;
  }

  Structure structure() {
    return structure;
  }

  int dimension() {
    return space.dimension();
  }

  int controls() {
    return last().controlStart() + last().controls();
  }

  int noises() {
    return last().noiseStart() + last().noises();
  }

  private BlockPlace last() {
    return places.get(places.size() - 1);
  }
}
