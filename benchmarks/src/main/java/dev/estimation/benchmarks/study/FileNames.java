package dev.estimation.benchmarks.study;

import java.util.HashSet;
import java.util.Locale;
import java.util.Set;

/**
 * Names of files, one a run, of letters, digits, points, hyphens and underscores, so that any file system takes them. No two
 * are equal, not even where a file system does not tell large letters from small ones.
 */
final class FileNames {
  private static final int LONGEST = 120;

  private final Set<String> taken = new HashSet<>();

  /** {@return a name that was not returned before, made of some words} */
  String next(String ending, String... words) {
    String stem = String.join("-", words).replaceAll("[^\\p{Alnum}._-]+", "_");
    String cut = stem.substring(0, Math.min(stem.length(), LONGEST));
    String name = cut + ending;
    for (int i = 2; !taken.add(name.toLowerCase(Locale.ROOT)); i++) {
      name = cut + "-" + i + ending;
    }
    return name;
  }
}
