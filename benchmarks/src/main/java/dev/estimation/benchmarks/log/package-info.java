/**
 * Reading what comes from outside: folders of comma-separated files, with errors that name file,
 * line and column.
 */
package dev.estimation.benchmarks.log;
