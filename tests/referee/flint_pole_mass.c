/* Pole mass, c_0 .. c_{N-1} at mu = m in decimals, with FLINT/Arb: one exponential for each product of gamma functions.
   Optional referee for values (checksum) and speed; no part of the build. With Debian's libflint-dev and libflint-arb-dev:
     gcc -O2 -o flint_pole_mass flint_pole_mass.c -lflint-arb -lflint -lgmp
     ./flint_pole_mass 300 300 [REPEAT]
   B(u) = (F(0,u) - sum_n g_n u^n/n!)/u, F(0,u) = 6 (1-u) e^{5u/3} Gamma(1+u) Gamma(1-2u)/Gamma(3-u),
   sum_n g_n a^n = (3+2a) Gamma(4+2a)/(3 Gamma(1-a) Gamma(2+a)^2 Gamma(3+a)). */
#include "flint_common.h"

/* L += m ln Gamma(1 + b u) */
static void add_lngamma(arb_poly_t L, arb_srcptr z, slong m, slong b, slong n, slong prec)
{
    arb_t t;
    fmpz_t p;
    slong k;
    arb_init(t);
    fmpz_init_set_ui(p, 1);
    for (k = 1; k < n; k++) {
        fmpz_mul_si(p, p, -b);
        if (k == 1) {
            arb_const_euler(t, prec);
            arb_mul_fmpz(t, t, p, prec);
        } else {
            arb_mul_fmpz(t, z + k, p, prec);
            arb_div_si(t, t, k, prec);
        }
        arb_addmul_si(L->coeffs + k, t, m, prec);
    }
    arb_clear(t);
    fmpz_clear(p);
}

/* f *= (c + b u) */
static void mul_linear(arb_ptr f, slong c, slong b, slong n, slong prec)
{
    slong k;
    for (k = n - 1; k >= 0; k--) {
        arb_mul_si(f + k, f + k, c, prec);
        if (k > 0)
            arb_addmul_si(f + k, f + k - 1, b, prec);
    }
}

static void start_logarithm(arb_poly_t L, slong n)
{
    slong k;
    arb_poly_fit_length(L, n);
    for (k = 0; k < n; k++)
        arb_zero(L->coeffs + k);
    _arb_poly_set_length(L, n);
}

static void on_shell(arb_poly_t F, arb_srcptr z, slong n, slong prec)
{
    arb_poly_t L;
    arb_t t;
    slong k;
    arb_poly_init(L);
    arb_init(t);
    start_logarithm(L, n);
    add_lngamma(L, z, 1, 1, n, prec);
    add_lngamma(L, z, 1, -2, n, prec);
    add_lngamma(L, z, -1, -1, n, prec);
    arb_set_si(t, 5);
    arb_div_si(t, t, 3, prec);
    arb_add(L->coeffs + 1, L->coeffs + 1, t, prec);
    arb_poly_exp_series(F, L, n, prec);
    arb_poly_fit_length(F, n);
    for (k = 0; k < n; k++)
        arb_mul_si(F->coeffs + k, F->coeffs + k, 6, prec);
    div_linear(F->coeffs, 2, -1, n, prec);
    arb_poly_clear(L);
    arb_clear(t);
}

static void anomalous(arb_poly_t G, arb_srcptr z, slong n, slong prec)
{
    arb_poly_t L;
    slong k;
    arb_poly_init(L);
    start_logarithm(L, n);
    add_lngamma(L, z, 1, 2, n, prec);
    add_lngamma(L, z, -1, -1, n, prec);
    add_lngamma(L, z, -3, 1, n, prec);
    arb_poly_exp_series(G, L, n, prec);
    arb_poly_fit_length(G, n);
    mul_linear(G->coeffs, 3, 2, n, prec);
    mul_linear(G->coeffs, 3, 2, n, prec);
    mul_linear(G->coeffs, 2, 2, n, prec);
    mul_linear(G->coeffs, 1, 2, n, prec);
    for (k = 0; k < n; k++)
        arb_div_si(G->coeffs + k, G->coeffs + k, 3, prec);
    for (k = 0; k < 3; k++)
        div_linear(G->coeffs, 1, 1, n, prec);
    div_linear(G->coeffs, 2, 1, n, prec);
    arb_poly_clear(L);
}

static unsigned long long pole_mass(slong count, slong digits)
{
    slong n, length = count + 2, prec = working_bits(count, digits);
    unsigned long long sum = 0;
    arb_ptr z = _arb_vec_init(length + 1);
    arb_poly_t F, G;
    arb_t c, g;
    fmpz_t factorial;
    arb_poly_init(F);
    arb_poly_init(G);
    arb_init(c);
    arb_init(g);
    fmpz_init_set_ui(factorial, 1);
    zeta_table(z, length + 1, prec);
    on_shell(F, z, length, prec);
    anomalous(G, z, length, prec);
    for (n = 0; n < count; n++) {
        if (n > 0)
            fmpz_mul_si(factorial, factorial, n);
        arb_mul_fmpz(c, F->coeffs + n + 1, factorial, prec);
        arb_div_si(g, G->coeffs + n + 1, n + 1, prec);
        arb_sub(c, c, g, prec);
        sum = add_to_checksum(sum, c, n, digits);
    }
    fmpz_clear(factorial);
    arb_clear(c);
    arb_clear(g);
    arb_poly_clear(F);
    arb_poly_clear(G);
    _arb_vec_clear(z, length + 1);
    return sum;
}

int main(int argc, char **argv)
{
    return repeated(argc, argv, pole_mass);
}
