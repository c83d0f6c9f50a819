/* Peer of the speed comparison: CVODE of SUNDIALS 6 in C; BDF, banded matrix, analytic derivative, event.
   Standard input and output as in diffsol/src/main.rs; the only argument is the number of repetitions. */
#include <cvode/cvode.h>
#include <math.h>
#include <nvector/nvector_serial.h>
#include <stdio.h>
#include <stdlib.h>
#include <sunlinsol/sunlinsol_band.h>
#include <sunmatrix/sunmatrix_band.h>
#include <time.h>

enum { MOST_NODES = 4096, MOST_STEPS = 100000, RUNS = 10, MOST_REPETITIONS = 99 };
static const double TOLERANCES[] = {1, .3, .1, .03, 1e-2, 1e-3, 1e-4};

/* Nodes in a row: insulated inside, film and radiation outside; SI and kelvin. */
typedef struct {
  char name[100];
  int nodes;
  double target, capacity[MOST_NODES], link[MOST_NODES], film, radiation, surroundings, start;
} System;

static int rate(realtype t, N_Vector temperatures, N_Vector rates, void *data) {
  (void)t;
  const System *s = data;
  const double *y = N_VGetArrayPointer(temperatures);
  double *out = N_VGetArrayPointer(rates), from_inside = 0, a = s->surroundings;
  for (int i = 0; i < s->nodes; i++) {
    double outwards = i + 1 < s->nodes
                          ? s->link[i] * (y[i] - y[i + 1])
                          : s->film * (y[i] - a) + s->radiation * (y[i] * y[i] * y[i] * y[i] - a * a * a * a);
    out[i] = (from_inside - outwards) / s->capacity[i];
    from_inside = outwards;
  }
  return 0;
}

static int derivative(realtype t, N_Vector temperatures, N_Vector rates, SUNMatrix out, void *data, N_Vector a,
                      N_Vector b, N_Vector c) {
  (void)t, (void)rates, (void)a, (void)b, (void)c;
  const System *s = data;
  const double *y = N_VGetArrayPointer(temperatures);
  for (int i = 0; i < s->nodes; i++) {
    double less = 0;
    if (i > 0) {
      less += s->link[i - 1];
      SM_ELEMENT_B(out, i, i - 1) = s->link[i - 1] / s->capacity[i];
    }
    if (i + 1 < s->nodes) {
      less += s->link[i];
      SM_ELEMENT_B(out, i, i + 1) = s->link[i] / s->capacity[i];
    } else {
      less += s->film + 4 * s->radiation * y[i] * y[i] * y[i];
    }
    SM_ELEMENT_B(out, i, i) = -less / s->capacity[i];
  }
  return 0;
}

static int event(realtype t, N_Vector temperatures, realtype *out, void *data) {
  (void)t;
  out[0] = N_VGetArrayPointer(temperatures)[0] - ((System *)data)->target;
  return 0;
}

/* One march to the asked time, s; not a number where it fails. */
static double march(System *s, double tolerance, long *steps, SUNContext context) {
  realtype t = 0;
  N_Vector y = N_VNew_Serial(s->nodes, context);
  N_VConst(s->start, y);
  void *solver = CVodeCreate(CV_BDF, context);
  CVodeInit(solver, rate, 0, y);
  CVodeSStolerances(solver, tolerance * 1e-3, tolerance);
  CVodeSetUserData(solver, s);
  CVodeSetMaxNumSteps(solver, MOST_STEPS);
  SUNMatrix matrix = SUNBandMatrix(s->nodes, 1, 1, context);
  SUNLinearSolver linear = SUNLinSol_Band(y, matrix, context);
  CVodeSetLinearSolver(solver, linear, matrix);
  CVodeSetJacFn(solver, derivative);
  CVodeRootInit(solver, 1, event);
  int ended = CVode(solver, 1e8, y, &t, CV_NORMAL);
  CVodeGetNumSteps(solver, steps);
  CVodeFree(&solver);
  SUNLinSolFree(linear);
  SUNMatDestroy(matrix);
  N_VDestroy(y);
  return ended == CV_ROOT_RETURN ? t : NAN;
}

static double processor_seconds(void) {
  struct timespec t;
  clock_gettime(CLOCK_PROCESS_CPUTIME_ID, &t);
  return t.tv_sec + 1e-9 * t.tv_nsec;
}

static int compare(const void *a, const void *b) {
  double difference = *(const double *)a - *(const double *)b;
  return (difference > 0) - (difference < 0);
}

/* The numbers of one line; how many. */
static int numbers(double *out) {
  static char *line;
  static size_t room;
  if (getline(&line, &room, stdin) < 0) return 0;
  int count = 0;
  char *at = line, *end;
  for (double x = strtod(at, &end); end != at && count < MOST_NODES; x = strtod(at, &end)) {
    out[count++] = x;
    at = end;
  }
  return count;
}

static int read_system(System *s) {
  double ends[MOST_NODES];
  if (scanf("%99s %lf\n", s->name, &s->target) < 2) return 0;
  s->nodes = numbers(s->capacity);
  numbers(s->link);
  if (numbers(ends) < 4) return 0;
  s->film = ends[0], s->radiation = ends[1], s->surroundings = ends[2], s->start = ends[3];
  return 1;
}

int main(int count, char **words) {
  int repetitions = count > 1 ? atoi(words[1]) : 5;
  if (repetitions < 1 || repetitions > MOST_REPETITIONS) return 2;
  SUNContext context;
  SUNContext_Create(NULL, &context);
  static System s;
  while (read_system(&s)) {
    for (size_t j = 0; j < sizeof TOLERANCES / sizeof *TOLERANCES; j++) {
      double times[MOST_REPETITIONS], found = NAN;
      long steps = 0;
      for (int r = 0; r < repetitions; r++) {
        double begin = processor_seconds();
        for (int run = 0; run < RUNS; run++) found = march(&s, TOLERANCES[j], &steps, context);
        times[r] = (processor_seconds() - begin) / RUNS;
      }
      qsort(times, repetitions, sizeof *times, compare);
      printf("%s %d bdf-band %g %.17g %ld %.6f\n", s.name, s.nodes, TOLERANCES[j], found, steps,
             times[repetitions / 2] * 1e3);
      fflush(stdout);
    }
  }
  SUNContext_Free(&context);
  return 0;
}
