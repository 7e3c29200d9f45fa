package dev.estimation.filters.modelcheck;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Set;

/** Collects findings, each kind once for each component, at its worst place; and notes. */
final class Ledger {
  private record Key(FindingKind kind, String method, String component) {}

  private static final class Entry {
    private ModelFinding worst;
    private double badness;
    private int places;
    private Arguments last;
  }

  private final Map<Key, Entry> entries = new LinkedHashMap<>();
  private final List<String> notes = new ArrayList<>();
  private final Set<FindingKind> accepted;

  Ledger(Set<FindingKind> accepted) {
    this.accepted = accepted;
  }

  /** Adds what was found at a place; of equal badness the first one stays. */
  void add(
      FindingKind kind,
      Operation operation,
      String component,
      Arguments at,
      double wanted,
      double got,
      double badness,
      String message) {
    Key key = new Key(kind, operation.method(), component);
    Entry entry = entries.computeIfAbsent(key, absent -> new Entry());
    if (entry.last != at) {
      entry.places++;
      entry.last = at;
    }
    if (entry.worst == null || badness > entry.badness) {
      boolean fault = kind.isFault() && !accepted.contains(kind);
      String text = operation.method() + ": " + message;
      entry.worst =
          new ModelFinding(kind, fault, component, wanted, got, at.place(), entry.places, text);
      entry.badness = badness;
    }
  }

  /** Adds that two calls do not agree, in the first entry where they differ. */
  void addDifference(
      FindingKind kind,
      Operation operation,
      Arguments at,
      Attempt wanted,
      Attempt got,
      String reason) {
    int i = wanted.firstDifference(got);
    String entry = i < 0 ? "call" : operation.entry(i);
    double said = i < 0 ? Double.NaN : wanted.out()[i];
    double now = i < 0 ? Double.NaN : got.out()[i];
    String message = entry + " must be " + said + ", " + reason + ", got " + now;
    add(kind, operation, entry, at, said, now, Math.abs(now - said), message);
  }

  void note(String text) {
    notes.add(text);
  }

  boolean has(FindingKind kind, Operation operation) {
    return entries.keySet().stream()
        .anyMatch(key -> key.kind == kind && key.method.equals(operation.method()));
  }

  boolean has(FindingKind kind, Operation operation, String component) {
    return entries.containsKey(new Key(kind, operation.method(), component));
  }

  ModelReport report(String title, int places) {
    List<ModelFinding> findings = new ArrayList<>();
    for (Entry entry : entries.values()) {
      ModelFinding f = entry.worst;
      findings.add(new ModelFinding(
          f.kind(),
          f.fault(),
          f.component(),
          f.wanted(),
          f.got(),
          f.place(),
          entry.places,
          f.message()));
    }
    findings.sort(
        Comparator.comparing(ModelFinding::fault).reversed().thenComparing(ModelFinding::kind));
    return new ModelReport(title, places, findings, notes);
  }
}
