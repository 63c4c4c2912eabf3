"""Quantiles of the normal distribution from SciPy. Usage: python3 normal_quantiles.py > normal_quantiles.csv"""
from scipy.stats import norm

print("share,quantile")
for share in (1e-6, 7.62939453125e-06, 1e-4, 0.001, 0.02, 0.0749, 0.0751, 0.2, 0.45, 0.5, 0.6, 0.9, 0.9251, 0.99, 0.999999):
    print(f"{share!r},{norm.ppf(share):.12f}")
