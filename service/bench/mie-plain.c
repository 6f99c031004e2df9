/* The size integral of one lognormal mode as plain C: what the program's own computation is measured against. */
#include <complex.h>
#include <math.h>
#include <stdio.h>
#include <stdlib.h>
#include <time.h>

/* adds weight times scattering, extinction and forward scattering of a sphere, m = n - ik */
static void sphere(double x, double complex m, double weight, double sums[3], double complex *d) {
  int terms = (int)(x + 4.05 * cbrt(x) + 2);
  double complex y = m * x;
  int start = (int)fmax(terms, cabs(y)) + 16;
  d[start] = 0;
  for (int j = start; j > 0; j--) {
    double complex q = j / y;
    d[j - 1] = q - 1 / (d[j] + q);
  }
  double psi0 = cos(x), psi1 = sin(x), chi0 = -sin(x), chi1 = cos(x);
  double complex a0 = 0, b0 = 0;
  double ext = 0, sca = 0, fwd = 0;
  for (int j = 1; j <= terms; j++) {
    double psi = (2 * j - 1) / x * psi1 - psi0, chi = (2 * j - 1) / x * chi1 - chi0;
    double complex xi = psi + I * chi, xi1 = psi1 + I * chi1;
    double complex da = d[j] / m + j / x, db = m * d[j] + j / x;
    double complex a = (da * psi - psi1) / (da * xi - xi1), b = (db * psi - psi1) / (db * xi - xi1);
    ext += (2 * j + 1) * creal(a + b);
    sca += (2 * j + 1) * (creal(a) * creal(a) + cimag(a) * cimag(a) + creal(b) * creal(b) + cimag(b) * cimag(b));
    fwd += (2 * j + 1.0) / (j * (j + 1.0)) * creal(a * conj(b));
    if (j > 1) fwd += (j - 1.0) * (j + 1.0) / j * creal(a0 * conj(a) + b0 * conj(b));
    a0 = a, b0 = b, psi0 = psi1, psi1 = psi, chi0 = chi1, chi1 = chi;
  }
  double scale = 2 * weight / (x * x);
  sums[0] += scale * sca, sums[1] += scale * ext, sums[2] += 2 * scale * fwd;
}

/* arguments: rounds, points, median and limits of the radius, sigma, n, k, then wavelengths */
int main(int count, char **given) {
  if (count < 9) return 2;
  int rounds = atoi(given[1]), points = atoi(given[2]);
  double median = atof(given[3]), low = atof(given[4]), high = atof(given[5]), spread = log(atof(given[6]));
  double complex m = atof(given[7]) - I * atof(given[8]);
  double complex *d = malloc(200000 * sizeof *d);
  double sums[3] = {0, 0, 0};
  clock_t start = clock();
  for (int round = 0; round < rounds; round++) {
    sums[0] = sums[1] = sums[2] = 0;
    for (int w = 9; w < count; w++) {
      double wavelength = atof(given[w]), step = log(high / low) / points;
      for (int i = 0; i < points; i++) {
        double r = low * exp((i + 0.5) * step), z = log(r / median) / spread;
        double weight = M_PI * step / (sqrt(2 * M_PI) * spread) * r * r * exp(-z * z / 2);
        sphere(2 * M_PI * r / wavelength, m, weight, sums, d);
      }
    }
  }
  printf("%.17g %.17g %.17g %.17g\n", 1000.0 * (clock() - start) / CLOCKS_PER_SEC / rounds, sums[0], sums[1], sums[2]);
  return 0;
}
