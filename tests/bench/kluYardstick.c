/*
 * Yardstick: refactorisation and solution of one complex sparse matrix by KLU (SuiteSparse), AMD ordering,
 * no scaling, no block triangular form: the fastest setting found for nodal matrices.
 *
 *   kluYardstick MATRIX MILLISECONDS
 *
 * MATRIX is text: n and the number of entries, then the column pointers, row indices and re im pairs.
 * Prints medians in microseconds: refactor, refactor + 1 solve, refactor + 3 solves, then the normalised
 * residual of the last solution.
 */
#include <complex.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>
#include <time.h>
#include "klu.h"

static double now(void) {
  struct timespec t;
  clock_gettime(CLOCK_MONOTONIC, &t);
  return 1e6 * t.tv_sec + 1e-3 * t.tv_nsec;
}

static int ascending(const void *a, const void *b) {
  double d = *(const double *)a - *(const double *)b;
  return d < 0 ? -1 : d > 0;
}

static int n, *Ap, *Ai;
static double *Ax, *b, *x;
static klu_common common;
static klu_symbolic *symbolic;
static klu_numeric *numeric;

static int read_matrix(const char *path) {
  FILE *file = fopen(path, "r");
  int nz;
  if (!file || fscanf(file, "%d %d", &n, &nz) != 2) return 0;
  Ap = malloc((n + 1) * sizeof(int));
  Ai = malloc(nz * sizeof(int));
  Ax = malloc(2 * nz * sizeof(double));
  for (int k = 0; k <= n; k++) if (fscanf(file, "%d", &Ap[k]) != 1) return 0;
  for (int k = 0; k < nz; k++) if (fscanf(file, "%d", &Ai[k]) != 1) return 0;
  for (int k = 0; k < 2 * nz; k++) if (fscanf(file, "%lf", &Ax[k]) != 1) return 0;
  fclose(file);
  return 1;
}

/* One refactorisation and `solves` solutions, microseconds. */
static double once(int solves) {
  double start = now();
  klu_z_refactor(Ap, Ai, Ax, symbolic, numeric, &common);
  if (solves) {
    memcpy(x, b, 2 * n * solves * sizeof(double));
    klu_z_solve(symbolic, numeric, n, solves, x, &common);
  }
  return now() - start;
}

static double median(int solves, double microseconds) {
  int size = 0, room = 1 << 20;
  double *times = malloc(room * sizeof(double));
  for (int k = 0; k < 50; k++) once(solves);
  for (double end = now() + microseconds; now() < end && size < room;) times[size++] = once(solves);
  qsort(times, size, sizeof(double), ascending);
  double middle = times[size / 2];
  free(times);
  return middle;
}

static double residual(void) {
  double complex *r = malloc(n * sizeof(double complex)), *z = (double complex *)x, *a = (double complex *)Ax;
  double norm = 0, worst = 0, xmax = 0, bmax = 0;
  for (int k = 0; k < n; k++) r[k] = ((double complex *)b)[k];
  for (int k = 0; k < n; k++) {
    double sum = 0;
    for (int p = Ap[k]; p < Ap[k + 1]; p++) {
      r[Ai[p]] -= a[p] * z[k];
      sum += cabs(a[p]);
    }
    if (sum > norm) norm = sum;
  }
  for (int k = 0; k < n; k++) {
    if (cabs(r[k]) > worst) worst = cabs(r[k]);
    if (cabs(z[k]) > xmax) xmax = cabs(z[k]);
    if (cabs(((double complex *)b)[k]) > bmax) bmax = cabs(((double complex *)b)[k]);
  }
  free(r);
  return worst / (norm * xmax + bmax);
}

int main(int argc, char **argv) {
  if (argc != 3 || !read_matrix(argv[1])) return fprintf(stderr, "usage: kluYardstick MATRIX MILLISECONDS\n"), 2;
  klu_defaults(&common);
  common.btf = 0;
  common.scale = 0;
  common.ordering = 0; /* AMD */
  b = malloc(6 * n * sizeof(double));
  x = malloc(6 * n * sizeof(double));
  for (int k = 0; k < 6 * n; k++) b[k] = 1.0 / (1 + k % 7);
  symbolic = klu_analyze(n, Ap, Ai, &common);
  numeric = symbolic ? klu_z_factor(Ap, Ai, Ax, symbolic, &common) : NULL;
  if (!numeric) return fprintf(stderr, "KLU could not factor the matrix\n"), 1;
  double share = 1e3 * atof(argv[2]) / 3;
  double refactor = median(0, share), one = median(1, share), three = median(3, share);
  printf("%.4f %.4f %.4f %.3e\n", refactor, one, three, residual());
  return 0;
}
