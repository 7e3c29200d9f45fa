/** Not API: dense kernels and argument checks shared by the library's own packages. May change at any time. */
package dev.estimation.core.internal;
