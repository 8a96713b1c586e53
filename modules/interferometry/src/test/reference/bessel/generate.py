"""Bessel functions J_n(x), e^-x I_n(x) and the entire G_n(w) at pseudo-random arguments, by mpmath 1.3.0 at 40 digits.

Columns: function, n, argument, value. Run: python3 generate.py > values.csv
"""
import random
import mpmath as mp

mp.mp.dps = 40
random.seed(20310501)
print("# mpmath %s, 40 digits, seed 20310501" % mp.__version__)
print("function,n,argument,value")


def g(n, w):
    return mp.hyp0f1(n + 1, -w / 4) / (mp.mpf(2) ** n * mp.factorial(n))


for n in list(range(0, 8)) + [12, 25, 60]:
    for k in range(60):
        decade = random.uniform(-4, 3.3)
        x = mp.mpf(float(10 ** decade))
        print("J,%d,%r,%s" % (n, float(x), mp.nstr(mp.besselj(n, x), 20)))
        print("I,%d,%r,%s" % (n, float(x), mp.nstr(mp.exp(-x) * mp.besseli(n, x), 20)))
for n in range(0, 5):
    for k in range(60):
        w = mp.mpf(float(random.choice([-1, 1]) * 10 ** random.uniform(-6, 3)))
        scale = mp.exp(-mp.sqrt(-w)) if w < 0 else mp.mpf(1)
        print("G,%d,%r,%s" % (n, float(w), mp.nstr(scale * g(n, w), 20)))
