/* Pole mass at mu = m and Adler function divided by 3 at mu = Q, c_0 .. c_{N-1} to P digits, in PARI/GP: the algorithm of
   flint_pole_mass.c and flint_adler.c ("same") and what one would write down ("natural"). Optional referee for values
   (checksum) and speed; no part of the build. For example
     echo 'poleMassSame(300, 300)' | gp -q -f -s 2G speed.gp
   prints the checksum sum_n sign(c_n) (n+1) (D_n mod q) mod q, q = 1000000007, D_n the first P digits of c_n. */

precise(N, P) = default(realprecision, P + 40 + 2*#digits(N));

checksum(c, P) = {
  my(q = 1000000007, s = 0, d, e);
  for(n = 0, #c - 1,
    e = P - 1 - floor(log(abs(c[n+1]))/log(10));
    d = round(abs(c[n+1])*10^e);
    if(d >= 10^P, d = round(d/10));
    s = (s + sign(c[n+1])*(n+1)*(d % q)) % q);
  s;
}

/* m ln Gamma(1 + b x) */
lg(m, b, z, M) = m*(-Euler*b*x + sum(k = 2, M, z[k]*(-b)^k/k*x^k)) + O(x^(M+1));

poleMassSame(N, P) = {
  my(M = N + 1, z, F, G, c, f = 1);
  precise(N, P);
  z = vector(M + 1, k, if(k > 1, zeta(k)));
  F = 6*exp(5*x/3 + lg(1, 1, z, M) + lg(1, -2, z, M) + lg(-1, -1, z, M))/(2 - x);
  G = exp(lg(1, 2, z, M) + lg(-1, -1, z, M) + lg(-3, 1, z, M));
  G = G*(3 + 2*x)^2*(2 + 2*x)*(1 + 2*x)/(3*(1 + x)^3*(2 + x));
  c = vector(N);
  for(n = 0, N - 1, if(n, f *= n); c[n+1] = f*polcoef(F, n+1) - polcoef(G, n+1)/(n+1));
  print(checksum(c, P));
}

poleMassNatural(N, P) = {
  my(o, F, G, c, f = 1);
  precise(N, P);
  o = O(x^(N+2));
  F = 6*(1 - x)*exp(5*x/3 + o)*gamma(1 + x + o)*gamma(1 - 2*x + o)/gamma(3 - x + o);
  G = (3 + 2*x)*gamma(4 + 2*x + o)/(3*gamma(1 - x + o)*gamma(2 + x + o)^2*gamma(3 + x + o));
  c = vector(N);
  for(n = 0, N - 1, if(n, f *= n); c[n+1] = f*polcoef(F, n+1) - polcoef(G, n+1)/(n+1));
  print(checksum(c, P));
}

adlerSame(N, P) = {
  my(z, b, F, f = 1);
  precise(N, P);
  z = vector(N + 1, k, if(k > 1, (1 - 2^(1-k))*zeta(k)));
  b = sum(m = 0, N - 1, if(m % 2, -2*(m+1)*z[m+2], 0)*x^m + (m+1)*(1 - 2^(-m-2))*x^m) + O(x^N);
  F = 8/3*exp(5*x/3 + O(x^N))*b/((1 - x)*(2 - x));
  print(checksum(vector(N, i, if(i > 1, f *= i-1); f*polcoef(F, i-1)), P));
}
