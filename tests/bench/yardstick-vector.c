/*
 * Vectorised C yardstick: the same wall as yardstick.c, in blocks, with cubic tables for what hangs on one unknown and the
 * compiler's vector mathematics for the rest.
 *
 *   cc -O3 -march=native -ffast-math -o vector yardstick-vector.c -lm && ./vector SAMPLES < correlation.txt
 */
#include <math.h>
#include <stdint.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>
#include <time.h>

enum { FILL_WEIGHT, FILL_ANGLE, SAND_WEIGHT, SAND_ANGLE, WATER, SURCHARGE, RATIO, THRUST, BEARING, WALL, N };
enum { BLOCK = 512, LANES = 8, PER = 64, CELLS = 12 * PER };
static const double PI = 3.14159265358979323846, GW = 9.81;

static uint32_t state[4][LANES];
static inline uint32_t rotl(uint32_t x, int k) { return (x << k) | (x >> (32 - k)); }
static void fill_bits(uint32_t *restrict out, int n) {
  for (int i = 0; i < n; i += LANES)
    for (int l = 0; l < LANES; l++) {
      uint32_t a = state[0][l], b = state[1][l], c = state[2][l], d = state[3][l];
      out[i + l] = rotl(a + d, 7) + a;
      uint32_t t = b << 9;
      c ^= a; d ^= b; b ^= c; a ^= d; c ^= t; d = rotl(d, 11);
      state[0][l] = a; state[1][l] = b; state[2][l] = c; state[3][l] = d;
    }
}
/* Box and Muller */
static void fill_normals(double *restrict out) {
  static uint32_t bits[BLOCK];
  fill_bits(bits, BLOCK);
  for (int i = 0; i < BLOCK / 2; i++) {
    double r = sqrt(-2 * log(((double)bits[i] + 0.5) * (1.0 / 4294967296.0)));
    double a = 2 * PI / 4294967296.0 * (double)bits[i + BLOCK / 2];
    out[i] = r * cos(a);
    out[i + BLOCK / 2] = r * sin(a);
  }
}

static double cdf(double u) { return 0.5 * erfc(-u * 0.70710678118654752440); }
static double quantile(double p) {
  double lo = -9, hi = 9;
  for (int i = 0; i < 80; i++) { double m = 0.5 * (lo + hi); if (cdf(m) < p) lo = m; else hi = m; }
  return 0.5 * (lo + hi);
}
static double lognormal(double u, double mean, double sd) { double z2 = log(1 + sd * sd / (mean * mean)); return exp(log(mean) - z2 / 2 + sqrt(z2) * u); }
static double water(double u) { double p = cdf(u), cut = 1.7 / 4; return p < cut ? 0.5 + sqrt(p * 4 * 1.7) : 4.5 - sqrt(cdf(-u) * 4 * 2.3); }
static double gumbel(double u) { double b = 3 * sqrt(6) / PI, x = 10 - 0.57721566490153286 * b - b * log(-log(cdf(u))); return x < 0 ? 0 : x; }
static double fill_angle(double u) { return PI / 180 * lognormal(u, 35, 2.8); }
static double sand_angle(double u) { double a = cdf(-8 / 2.6), b = cdf(9 / 2.6); return PI / 180 * (33 + 2.6 * quantile(a + (b - a) * cdf(u))); }
static double ka(double phi) { double t = tan(PI / 4 - phi / 2); return t * t; }
static double nq(double phi) { double t = tan(PI / 4 + phi / 2); return exp(PI * tan(phi)) * t * t; }
static double t_ka1(double u) { return ka(fill_angle(u)); }
static double t_ka2(double u) { return ka(sand_angle(u)); }
static double t_nq(double u) { return nq(sand_angle(u)); }
static double t_ng(double u) { return 2 * (nq(sand_angle(u)) + 1) * tan(sand_angle(u)); }
static double t_ratio(double u) { return 0.7 + 0.25 * cdf(u); }
static double t_thrust(double u) { return lognormal(u, 1, 0.1); }
static double t_bearing(double u) { return lognormal(u, 1, 0.15); }

typedef struct { double c[CELLS][4]; } Table;
static void tabulate(Table *t, double (*f)(double)) {
  for (int k = 0; k < CELLS; k++) {
    double a = -6 + (double)k / PER, h = 1.0 / PER, y0 = f(a), y1 = f(a + h / 3), y2 = f(a + 2 * h / 3), y3 = f(a + h);
    t->c[k][0] = y0;
    t->c[k][1] = (-11 * y0 + 18 * y1 - 9 * y2 + 2 * y3) / 2;
    t->c[k][2] = (18 * y0 - 45 * y1 + 36 * y2 - 9 * y3) / 2;
    t->c[k][3] = (-9 * y0 + 27 * y1 - 27 * y2 + 9 * y3) / 2;
  }
}
static inline void look_up(const Table *restrict t, const double *restrict u, double *restrict out) {
  for (int i = 0; i < BLOCK; i++) {
    double v = (u[i] + 6) * PER;
    v = v < 0 ? 0 : v > CELLS - 1e-9 ? CELLS - 1e-9 : v;
    int k = (int)v;
    double x = v - k;
    const double *c = t->c[k];
    out[i] = c[0] + x * (c[1] + x * (c[2] + x * c[3]));
  }
}
#define CLAMP(x, lo, hi) ((x) < (lo) ? (lo) : (x) > (hi) ? (hi) : (x))

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
  uint64_t seed = 42;
  for (int w = 0; w < 4; w++) for (int l = 0; l < LANES; l++) { seed = seed * 6364136223846793005ull + 1442695040888963407ull; state[w][l] = (uint32_t)(seed >> 32); }
  static Table k1, k2, phi2, waterT, gumbelT, nqT, ngT, ratioT, thrustT, bearingT;
  tabulate(&k1, t_ka1); tabulate(&k2, t_ka2); tabulate(&phi2, sand_angle); tabulate(&waterT, water); tabulate(&gumbelT, gumbel);
  tabulate(&nqT, t_nq); tabulate(&ngT, t_ng); tabulate(&ratioT, t_ratio); tabulate(&thrustT, t_thrust); tabulate(&bearingT, t_bearing);
  static double z[N][BLOCK], u[N][BLOCK], K1[BLOCK], K2[BLOCK], P2[BLOCK], LV[BLOCK], Q[BLOCK], NQ[BLOCK], NG[BLOCK], RA[BLOCK], FT[BLOCK], FB[BLOCK];
  const double h = 5.0, crest = 0.3, foot = 0.5, toe = 0.8, heel = 2.4, t = 0.5, B = toe + foot + heel, H = h + t;
  const double fillSat = 21, sandSat = 20, boundary = 2.5, frontLevel = 1.0, frontWater = 0.5;
  const double lean = (foot - crest) / h, d = frontLevel - t, toeArea = toe * d + 0.5 * lean * d * d;
  const double toeX = 0.5 * toe * toe * d + 0.5 * toe * lean * d * d + lean * lean * d * d * d / 6;
  const double wallArea = 0.5 * (foot - crest) * h + crest * h + B * t;
  const double wallX = 0.5 * (foot - crest) * h * (toe + 2.0 / 3 * (foot - crest)) + crest * h * (toe + foot - crest / 2) + B * t * B / 2;
  long fs = 0, fo = 0, fq = 0, fa = 0;
  struct timespec a, b;
  clock_gettime(CLOCK_PROCESS_CPUTIME_ID, &a);
  for (long n = 0; n < samples; n += BLOCK) {
    for (int i = 0; i < N; i++) fill_normals(z[i]);
    for (int i = 0; i < N; i++) {
      for (int s = 0; s < BLOCK; s++) u[i][s] = L[i][i] * z[i][s];
      for (int j = 0; j < i; j++) if (fabs(L[i][j]) > 1e-15) for (int s = 0; s < BLOCK; s++) u[i][s] += L[i][j] * z[j][s];
    }
    look_up(&k1, u[FILL_ANGLE], K1); look_up(&k2, u[SAND_ANGLE], K2); look_up(&phi2, u[SAND_ANGLE], P2);
    look_up(&nqT, u[SAND_ANGLE], NQ); look_up(&ngT, u[SAND_ANGLE], NG); look_up(&waterT, u[WATER], LV);
    look_up(&gumbelT, u[SURCHARGE], Q); look_up(&ratioT, u[RATIO], RA); look_up(&thrustT, u[THRUST], FT); look_up(&bearingT, u[BEARING], FB);
    int cs = 0, co = 0, cq = 0, ca = 0;
    for (int s = 0; s < BLOCK; s++) {
      double g1 = 19 + 0.95 * u[FILL_WEIGHT][s], g2 = 18 + 0.9 * u[SAND_WEIGHT][s], gc = 24 + 0.7 * u[WALL][s], level = LV[s], q = Q[s];
      double w1 = CLAMP(level, boundary, H), w2 = CLAMP(level, 0, boundary);
      double s0 = q, s1 = s0 + g1 * (H - w1), s2 = s1 + (fillSat - GW) * (w1 - boundary), s3 = s2 + g2 * (boundary - w2), s4 = s3 + (sandSat - GW) * w2;
      double P = 0, M = 0, f, dd;
      dd = H - w1; f = 0.5 * K1[s] * (s0 + s1) * dd; P += f; M += f * w1 + dd * dd * K1[s] * (2 * s0 + s1) / 6;
      dd = w1 - boundary; f = 0.5 * K1[s] * (s1 + s2) * dd; P += f; M += f * boundary + dd * dd * K1[s] * (2 * s1 + s2) / 6;
      dd = boundary - w2; f = 0.5 * K2[s] * (s2 + s3) * dd; P += f; M += f * w2 + dd * dd * K2[s] * (2 * s2 + s3) / 6;
      dd = w2; f = 0.5 * K2[s] * (s3 + s4) * dd; P += f; M += dd * dd * K2[s] * (2 * s3 + s4) / 6;
      P *= FT[s]; M *= FT[s];
      double push = 0.5 * GW * level * level, front = 0.5 * GW * frontWater * frontWater;
      double E = P + push - front, uplift = 0.5 * GW * (level + frontWater) * B, upliftMoment = GW * (2 * level + frontWater) * B * B / 6;
      double wh = CLAMP(level, t, H), top = wh > boundary ? wh : boundary, low = wh < boundary ? wh : boundary;
      double soil = heel * (g1 * (H - top) + fillSat * (top - boundary) + g2 * (boundary - low) + sandSat * (low - t));
      double W = gc * wallArea + soil + g2 * toeArea, Mst = gc * wallX + soil * (B - heel / 2) + g2 * toeX;
      double Nf = W - uplift, Mot = M + push * level / 3 - front * frontWater / 3 + upliftMoment;
      double x = (Mst - Mot) / Nf, width = 2 * (x < B - x ? x : B - x);
      double phi = RA[s] * P2[s], i = 1 - E / Nf, q0 = g2 * (frontLevel - frontWater) + (sandSat - GW) * frontWater;
      i = i < 0 ? 0 : i;
      double capacity = FB[s] * (q0 * NQ[s] * i * i + 0.5 * (sandSat - GW) * width * NG[s] * i * i * i);
      int slide = Nf <= 0 || Nf * tan(phi) < E, over = Mst < Mot, bear = Nf <= 0 || width <= 0 || capacity * width < Nf;
      cs += slide; co += over; cq += bear; ca += slide | over | bear;
    }
    fs += cs; fo += co; fq += cq; fa += ca;
  }
  clock_gettime(CLOCK_PROCESS_CPUTIME_ID, &b);
  long done = (samples + BLOCK - 1) / BLOCK * BLOCK;
  printf("{\"samples\": %ld, \"failures\": [%ld, %ld, %ld, %ld], \"seconds\": %.6f}\n", done, fs, fo, fq, fa, (b.tv_sec - a.tv_sec) + 1e-9 * (b.tv_nsec - a.tv_nsec));
  return 0;
}
