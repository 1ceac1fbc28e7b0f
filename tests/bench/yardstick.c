/*
 * Plain C yardstick: the wall of bench.yaml written out by hand, one sample after the other, libm alone.
 *
 *   cc -O3 -march=native -o yardstick yardstick.c -lm && ./yardstick SAMPLES < correlation.txt
 *
 * correlation.txt holds the 10 x 10 correlation of the normals, row by row, in the order of `enum`. It prints the number of
 * failures by sliding, overturning, bearing and any of them, and the seconds of the loop, so that the two programs can
 * be seen to assess the same wall.
 */
#include <math.h>
#include <stdint.h>
#include <stdio.h>
#include <stdlib.h>
#include <time.h>

enum { FILL_WEIGHT, FILL_ANGLE, SAND_WEIGHT, SAND_ANGLE, WATER, SURCHARGE, RATIO, THRUST, BEARING, WALL, N };

static const double PI = 3.14159265358979323846, GW = 9.81;

/* xoshiro128++ (Blackman and Vigna 2021) */
static uint32_t s[4] = {0x9E3779B9u, 0x243F6A88u, 0xB7E15162u, 0xDEADBEEFu};
static inline uint32_t rotl(uint32_t x, int k) { return (x << k) | (x >> (32 - k)); }
static inline uint32_t next(void) {
  uint32_t r = rotl(s[0] + s[3], 7) + s[0], t = s[1] << 9;
  s[2] ^= s[0]; s[3] ^= s[1]; s[1] ^= s[2]; s[0] ^= s[3]; s[2] ^= t; s[3] = rotl(s[3], 11);
  return r;
}
static inline double uniform(void) { return (next() + 0.5) * (1.0 / 4294967296.0); }

/* Marsaglia's polar method */
static double spare; static int has_spare;
static inline double normal(void) {
  if (has_spare) { has_spare = 0; return spare; }
  double a, b, q;
  do { a = 2 * uniform() - 1; b = 2 * uniform() - 1; q = a * a + b * b; } while (q >= 1 || q == 0);
  double f = sqrt(-2 * log(q) / q);
  spare = b * f; has_spare = 1;
  return a * f;
}
static inline double cdf(double u) { return 0.5 * erfc(-u * 0.70710678118654752440); }

/* Acklam's rational start and one step of Halley: the normal quantile */
static double quantile(double p) {
  static const double a[] = {-3.969683028665376e+01, 2.209460984245205e+02, -2.759285104469687e+02, 1.383577518672690e+02, -3.066479806614716e+01, 2.506628277459239e+00};
  static const double b[] = {-5.447609879822406e+01, 1.615858368580409e+02, -1.556989798598866e+02, 6.680131188771972e+01, -1.328068155288572e+01};
  static const double c[] = {-7.784894002430293e-03, -3.223964580411365e-01, -2.400758277161838e+00, -2.549732539343734e+00, 4.374664141464968e+00, 2.938163982698783e+00};
  static const double d[] = {7.784695709041462e-03, 3.224671290700398e-01, 2.445134137142996e+00, 3.754408661907416e+00};
  double x, q, r;
  if (p < 0.02425) { q = sqrt(-2 * log(p)); x = (((((c[0]*q+c[1])*q+c[2])*q+c[3])*q+c[4])*q+c[5]) / ((((d[0]*q+d[1])*q+d[2])*q+d[3])*q+1); }
  else if (p <= 0.97575) { q = p - 0.5; r = q * q; x = (((((a[0]*r+a[1])*r+a[2])*r+a[3])*r+a[4])*r+a[5])*q / (((((b[0]*r+b[1])*r+b[2])*r+b[3])*r+b[4])*r+1); }
  else { q = sqrt(-2 * log(1 - p)); x = -(((((c[0]*q+c[1])*q+c[2])*q+c[3])*q+c[4])*q+c[5]) / ((((d[0]*q+d[1])*q+d[2])*q+d[3])*q+1); }
  double e = cdf(x) - p, u = e * sqrt(2 * PI) * exp(x * x / 2);
  return x - u / (1 + x * u / 2);
}

static inline double lognormal(double u, double mean, double sd) {
  double z2 = log(1 + sd * sd / (mean * mean));
  return exp(log(mean) - z2 / 2 + sqrt(z2) * u);
}
static inline double triangular(double u, double from, double peak, double to) {
  double p = cdf(u), cut = (peak - from) / (to - from);
  return p < cut ? from + sqrt(p * (to - from) * (peak - from)) : to - sqrt((1 - p) * (to - from) * (to - peak));
}
static inline double gumbel(double u, double mean, double sd) {
  double beta = sd * sqrt(6) / PI;
  return mean - 0.57721566490153286 * beta - beta * log(-log(cdf(u)));
}
static inline double clamp(double x, double lo, double hi) { return x < lo ? lo : x > hi ? hi : x; }

int main(int argc, char **argv) {
  long samples = argc > 1 ? atol(argv[1]) : 1000000;
  double L[N][N] = {{0}};
  for (int i = 0; i < N; i++) {
    double row[N];
    for (int j = 0; j < N; j++) if (scanf("%lf", &row[j]) != 1) return 2;
    for (int j = 0; j <= i; j++) {
      double t = row[j];
      for (int k = 0; k < j; k++) t -= L[i][k] * L[j][k];
      L[i][j] = i == j ? sqrt(t) : t / L[j][j];
    }
  }
  const double h = 5.0, crest = 0.3, foot = 0.5, toe = 0.8, heel = 2.4, t = 0.5, B = toe + foot + heel, H = h + t;
  const double deg = PI / 180, fillSat = 21, sandSat = 20, boundary = 2.5, frontLevel = 1.0, frontWater = 0.5;
  const double pa = cdf((25 - 33) / 2.6), pb = cdf((42 - 33) / 2.6);
  long failures[4] = {0};
  struct timespec a, b;
  clock_gettime(CLOCK_PROCESS_CPUTIME_ID, &a);
  for (long n = 0; n < samples; n++) {
    double z[N], u[N];
    for (int i = 0; i < N; i++) z[i] = normal();
    for (int i = 0; i < N; i++) { double v = 0; for (int j = 0; j <= i; j++) v += L[i][j] * z[j]; u[i] = v; }
    double g1 = 19 + 0.95 * u[FILL_WEIGHT], phi1 = deg * lognormal(u[FILL_ANGLE], 35, 2.8);
    double g2 = 18 + 0.9 * u[SAND_WEIGHT], phi2 = deg * (33 + 2.6 * quantile(pa + (pb - pa) * cdf(u[SAND_ANGLE])));
    double level = triangular(u[WATER], 0.5, 2.2, 4.5), q = gumbel(u[SURCHARGE], 10, 3);
    double ratio = 0.7 + 0.25 * cdf(u[RATIO]), ft = lognormal(u[THRUST], 1, 0.1), fb = lognormal(u[BEARING], 1, 0.15);
    double gc = 24 + 0.7 * u[WALL];
    if (q < 0) q = 0;
    double t1 = tan(PI / 4 - phi1 / 2), t2 = tan(PI / 4 - phi2 / 2), k1 = t1 * t1, k2 = t2 * t2;

    double w1 = clamp(level, boundary, H), w2 = clamp(level, 0, boundary);
    double s0 = q, s1 = s0 + g1 * (H - w1), s2 = s1 + (fillSat - GW) * (w1 - boundary), s3 = s2 + g2 * (boundary - w2), s4 = s3 + (sandSat - GW) * w2;
    double P = 0, M = 0;
    double top[4] = {H, w1, boundary, w2}, bottom[4] = {w1, boundary, w2, 0};
    double from[4] = {k1 * s0, k1 * s1, k2 * s2, k2 * s3}, to[4] = {k1 * s1, k1 * s2, k2 * s3, k2 * s4};
    for (int i = 0; i < 4; i++) {
      double d = top[i] - bottom[i], f = 0.5 * (from[i] + to[i]) * d;
      P += f;
      M += f * bottom[i] + d * d * (2 * from[i] + to[i]) / 6;
    }
    P *= ft; M *= ft;
    double water = 0.5 * GW * level * level, front = 0.5 * GW * frontWater * frontWater;
    double E = P + water - front, uplift = 0.5 * GW * (level + frontWater) * B, upliftMoment = GW * (2 * level + frontWater) * B * B / 6;

    double stemTriangle = 0.5 * (foot - crest) * h * gc, stem = crest * h * gc, slab = B * t * gc;
    double W = stemTriangle + stem + slab;
    double Mst = stemTriangle * (toe + 2.0 / 3 * (foot - crest)) + stem * (toe + foot - crest / 2) + slab * B / 2;
    double wh = clamp(level, t, H), fillDry = H - (wh > boundary ? wh : boundary), fillWet = wh > boundary ? wh - boundary : 0;
    double sandDry = boundary - (wh < boundary ? wh : boundary), sandWet = (wh < boundary ? wh : boundary) - t;
    double soil = heel * (g1 * fillDry + fillSat * fillWet + g2 * sandDry + sandSat * sandWet);
    W += soil; Mst += soil * (B - heel / 2);
    double lean = (foot - crest) / h, d = frontLevel - t, toeArea = toe * d + 0.5 * lean * d * d;
    double toeX = 0.5 * toe * toe * d + 0.5 * toe * lean * d * d + lean * lean * d * d * d / 6;
    W += g2 * toeArea; Mst += g2 * toeX;
    double normalForce = W - uplift, Mot = M + water * level / 3 - front * frontWater / 3 + upliftMoment;
    double x = (Mst - Mot) / normalForce, width = 2 * (x < B - x ? x : B - x);

    double slide = E > 0 ? normalForce * tan(ratio * phi2) / E : 1e3, over = Mot > 0 ? Mst / Mot : 1e3, bear = 0;
    if (normalForce <= 0) slide = 0;
    else if (width > 0) {
      double tp = tan(phi2), tq = tan(PI / 4 + phi2 / 2), nq = exp(PI * tp) * tq * tq, ng = 2 * (nq + 1) * tp;
      double q0 = g2 * (frontLevel - frontWater) + (sandSat - GW) * frontWater, i = 1 - E / normalForce;
      if (i < 0) i = 0;
      bear = fb * (q0 * nq * i * i + 0.5 * (sandSat - GW) * width * ng * i * i * i) / (normalForce / width);
    }
    failures[0] += slide < 1; failures[1] += over < 1; failures[2] += bear < 1;
    failures[3] += slide < 1 || over < 1 || bear < 1;
  }
  clock_gettime(CLOCK_PROCESS_CPUTIME_ID, &b);
  double seconds = (b.tv_sec - a.tv_sec) + 1e-9 * (b.tv_nsec - a.tv_nsec);
  printf("{\"samples\": %ld, \"failures\": [%ld, %ld, %ld, %ld], \"seconds\": %.6f}\n", samples, failures[0], failures[1], failures[2], failures[3], seconds);
  return 0;
}
