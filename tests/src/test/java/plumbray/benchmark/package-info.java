/**
 * How fast rays and mappings are, beside a library's integrator that carries the same equations to
 * the same accuracy. {@link plumbray.benchmark.BenchmarkReport} measures and prints.
 */
package plumbray.benchmark;
