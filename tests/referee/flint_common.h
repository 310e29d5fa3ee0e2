/* Shared parts of flint_pole_mass.c and flint_adler.c: power series of log-gammas, linear factors, checksum. */
#include <stdio.h>
#include <stdlib.h>
#include <time.h>
#include <arb.h>
#include <arb_poly.h>

/* Working precision for coefficients up to index n to so many digits. With 40 bits in place of 120 a few last digits of the
   pole mass at 1000 coefficients and digits are off by one. */
static slong working_bits(slong n, slong digits)
{
    return (slong) (digits * 3.3219280948873626) + 2 * FLINT_BIT_COUNT(n) + 120;
}

/* z[k] = zeta(k) for 2 <= k < n */
static void zeta_table(arb_ptr z, slong n, slong prec)
{
    slong k;
    for (k = 2; k < n; k++)
        arb_zeta_ui(z + k, k, prec);
}

/* f /= (c + b u) */
static void div_linear(arb_ptr f, slong c, slong b, slong n, slong prec)
{
    slong k;
    for (k = 0; k < n; k++) {
        if (k > 0)
            arb_submul_si(f + k, f + k - 1, b, prec);
        arb_div_si(f + k, f + k, c, prec);
    }
}

#define CHECKSUM_MODULUS 1000000007ULL

/* Adds sign(c_n) (n+1) (D_n mod q) to a sum mod q, D_n the first digits of the decimal text. */
static unsigned long long add_to_checksum(unsigned long long sum, arb_t value, slong n, slong digits)
{
    char *text = arb_get_str(value, digits, ARB_STR_NO_RADIUS), *c;
    unsigned long long q = CHECKSUM_MODULUS, d = 0, term;
    slong seen = 0;
    for (c = text; *c && *c != 'e'; c++)
        if (*c >= '0' && *c <= '9' && (seen > 0 || *c != '0')) {
            d = (d * 10 + (*c - '0')) % q;
            seen++;
        }
    for (; seen < digits; seen++)
        d = d * 10 % q;
    term = d * (n + 1) % q;
    sum = text[0] == '-' ? (sum + q - term) % q : (sum + term) % q;
    flint_free(text);
    return sum;
}

/* Runs a job as often as asked for and prints its checksum and the processor time of each run. */
static int repeated(int argc, char **argv, unsigned long long (*job)(slong, slong))
{
    int r, repeat = argc > 3 ? atoi(argv[3]) : 1;
    if (argc < 3) {
        fprintf(stderr, "usage: %s COEFFICIENTS DIGITS [REPEAT]\n", argv[0]);
        return 2;
    }
    for (r = 0; r < repeat; r++) {
        clock_t start = clock();
        unsigned long long sum = job(atol(argv[1]), atol(argv[2]));
        if (r == 0)
            printf("checksum %llu\n", sum);
        printf("cpu %.4f\n", (double) (clock() - start) / CLOCKS_PER_SEC);
    }
    flint_cleanup();
    return 0;
}
