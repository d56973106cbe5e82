/*
 * Tikhonov solutions, L-curve corner and generalised cross-validation by the GNU Scientific Library (gsl_multifit_linear_*), for
 * tests/reference/free-form.py, which starts it:
 *     gcc -O1 -o free-form tests/reference/free-form.c -lgsl -lgslcblas -lm
 * Reads from stdin: n p m, X (n rows of p), L (m rows of p; m = 0 means the identity), y (n), a count of values of lambda and the values
 * (descending). Writes lines of numbers: the version; lambda, |y - Xc|, |Lc|, G for each; the index of the corner; the lambda and G of the
 * lowest G; then c for each lambda and for that one. GSL takes |y - Xc|^2 + lambda^2 |Lc|^2, so lambda^2 is the strength.
 */
#include <stdio.h>
#include <stdlib.h>
#include <gsl/gsl_errno.h>
#include <gsl/gsl_version.h>
#include <gsl/gsl_multifit.h>

static double number(void) {
  double value;
  if (scanf("%lf", &value) != 1) {
    fprintf(stderr, "too few numbers\n");
    exit(1);
  }
  return value;
}

static gsl_matrix *matrix(size_t rows, size_t columns) {
  gsl_matrix *a = gsl_matrix_alloc(rows, columns);
  for (size_t i = 0; i < rows; i++)
    for (size_t j = 0; j < columns; j++) gsl_matrix_set(a, i, j, number());
  return a;
}

static gsl_vector *vector(size_t size) {
  gsl_vector *a = gsl_vector_alloc(size);
  for (size_t i = 0; i < size; i++) gsl_vector_set(a, i, number());
  return a;
}

int main(void) {
  const size_t n = (size_t)number(), p = (size_t)number(), m = (size_t)number();
  gsl_matrix *X = matrix(n, p);
  gsl_matrix *L = m > 0 ? matrix(m, p) : NULL;
  gsl_vector *y = vector(n);
  const size_t count = (size_t)number();
  gsl_vector *lambda = vector(count);

  gsl_multifit_linear_workspace *work = gsl_multifit_linear_alloc(n, p);
  gsl_matrix *Xs = X, *M = NULL, *LQR = NULL;
  gsl_vector *ys = y, *tau = NULL;
  size_t size = p;
  if (L) {
    const size_t least = m < p ? m : p;
    LQR = gsl_matrix_alloc(m, p);
    gsl_matrix_memcpy(LQR, L);
    tau = gsl_vector_alloc(least);
    gsl_multifit_linear_L_decomp(LQR, tau);
    size = m;
    Xs = gsl_matrix_alloc(n - (p - m), m);
    ys = gsl_vector_alloc(n - (p - m));
    M = gsl_matrix_alloc(n, p);
    gsl_multifit_linear_stdform2(LQR, tau, X, y, Xs, ys, M, work);
  }
  gsl_multifit_linear_svd(Xs, work);

  gsl_vector *cs = gsl_vector_alloc(size), *c = gsl_vector_alloc(p);
  gsl_vector *rho = gsl_vector_alloc(count), *eta = gsl_vector_alloc(count), *G = gsl_vector_alloc(count);
  gsl_vector *UTy = gsl_vector_alloc(size);
  double delta0, best = 0, bestG = 0;
  gsl_vector *reg = gsl_vector_alloc(count);
  gsl_multifit_linear_gcv_init(ys, reg, UTy, &delta0, work);
  gsl_vector_memcpy(reg, lambda);
  gsl_multifit_linear_gcv_curve(reg, UTy, delta0, G, work);
  gsl_multifit_linear_gcv_min(reg, UTy, G, delta0, &best, work);
  bestG = gsl_multifit_linear_gcv_calc(best, UTy, delta0, work);
  for (size_t k = 0; k < count; k++) {
    double r, s;
    gsl_multifit_linear_solve(gsl_vector_get(lambda, k), Xs, ys, cs, &r, &s, work);
    gsl_vector_set(rho, k, r);
    gsl_vector_set(eta, k, s);
  }
  size_t corner = 0;
  gsl_set_error_handler_off();
  const int status = gsl_multifit_linear_lcorner(rho, eta, &corner);

  printf("%s\n", GSL_VERSION);
  for (size_t k = 0; k < count; k++)
    printf("%.17g %.17g %.17g %.17g\n", gsl_vector_get(lambda, k), gsl_vector_get(rho, k), gsl_vector_get(eta, k),
           gsl_vector_get(G, k));
  printf("%d\n%.17g %.17g\n", status == GSL_SUCCESS ? (int)corner : -1, best, bestG);
  for (size_t k = 0; k <= count; k++) {
    double r, s;
    /* genform2 writes into the workspace that solve reads the decomposition from: without this the second solution is wrong. */
    gsl_multifit_linear_svd(Xs, work);
    gsl_multifit_linear_solve(k < count ? gsl_vector_get(lambda, k) : best, Xs, ys, cs, &r, &s, work);
    if (L)
      gsl_multifit_linear_genform2(LQR, tau, X, y, cs, M, c, work);
    else
      gsl_vector_memcpy(c, cs);
    for (size_t j = 0; j < p; j++) printf("%.17g ", gsl_vector_get(c, j));
    printf("\n");
  }
  return 0;
}
