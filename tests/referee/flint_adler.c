/* Adler function divided by c_0 = 3, c_0 .. c_{N-1} at mu = Q in decimals, with FLINT/Arb; no gamma function is left.
   Optional referee for values (checksum) and speed; no part of the build. With Debian's libflint-dev and libflint-arb-dev:
     gcc -O2 -o flint_adler flint_adler.c -lflint-arb -lflint -lgmp
     ./flint_adler 300 300 [REPEAT]
   B(u) = (8/3) e^{5u/3} (b(1+u) - b(3-u))/((1-u)(2-u)), b(z) = sum_{j>=0} (-1)^j/(j+z)^2. With zb(s) = (1-2^{1-s}) zeta(s):
   b(1+u) = sum_m (-1)^m (m+1) zb(m+2) u^m, b(3-u) = b(1-u) - 1/(1-u)^2 + 1/(2-u)^2. */
#include "flint_common.h"

/* b(1+u) - b(3-u): even powers cancel but for the two rational terms */
static void difference(arb_ptr f, arb_srcptr z, slong n, slong prec)
{
    arb_t t;
    slong m;
    arb_init(t);
    for (m = 0; m < n; m++) {
        arb_zero(f + m);
        if (m % 2 == 1) {
            arb_mul_2exp_si(t, z + m + 2, -(m + 1));
            arb_sub(t, z + m + 2, t, prec);
            arb_mul_si(f + m, t, -2 * (m + 1), prec);
        }
        arb_add_si(f + m, f + m, m + 1, prec);
        arb_set_si(t, m + 1);
        arb_mul_2exp_si(t, t, -(m + 2));
        arb_sub(f + m, f + m, t, prec);
    }
    arb_clear(t);
}

static unsigned long long adler(slong count, slong digits)
{
    slong n, prec = working_bits(count, digits);
    unsigned long long sum = 0;
    arb_ptr z = _arb_vec_init(count + 3);
    arb_poly_t f, e;
    arb_t c;
    fmpz_t factorial;
    arb_init(c);
    fmpz_init_set_ui(factorial, 1);
    arb_poly_init2(f, count);
    arb_poly_init2(e, count);
    zeta_table(z, count + 3, prec);
    difference(f->coeffs, z, count, prec);
    div_linear(f->coeffs, 1, -1, count, prec);
    div_linear(f->coeffs, 2, -1, count, prec);
    _arb_poly_set_length(f, count);
    arb_set_si(c, 8);
    arb_div_si(c, c, 3, prec);
    arb_set(e->coeffs, c);
    for (n = 1; n < count; n++) {
        arb_mul_si(e->coeffs + n, e->coeffs + n - 1, 5, prec);
        arb_div_si(e->coeffs + n, e->coeffs + n, 3 * n, prec);
    }
    _arb_poly_set_length(e, count);
    arb_poly_mullow(f, f, e, count, prec);
    arb_poly_fit_length(f, count);
    for (n = 0; n < count; n++) {
        if (n > 0)
            fmpz_mul_si(factorial, factorial, n);
        arb_mul_fmpz(c, f->coeffs + n, factorial, prec);
        sum = add_to_checksum(sum, c, n, digits);
    }
    fmpz_clear(factorial);
    arb_clear(c);
    arb_poly_clear(f);
    arb_poly_clear(e);
    _arb_vec_clear(z, count + 3);
    return sum;
}

int main(int argc, char **argv)
{
    return repeated(argc, argv, adler);
}
