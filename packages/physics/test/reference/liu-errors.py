"""Standard errors of a Liu fit, apart from our formulas: a nonlinear fit of D^2 = 2 w^2 ln(E/Eth) in (w, Eth) and of
D^2 = 2 w^2 ln(2 E / (pi w^2 Fth)) in (w, Fth), errors from scipy's covariance (residuals over n - 2). numpy 2.4, scipy 1.17."""
import numpy as np
from scipy.optimize import curve_fit

energies_uj = np.array([4, 5, 6.5, 8, 10, 13, 18, 25])
diameters_um = np.array([12.1, 17.4, 22, 25.3, 28.9, 32.2, 37.1, 41])

by_energy = lambda e, w, threshold: 2 * w**2 * np.log(e / threshold)
by_fluence = lambda e, w, threshold: 2 * w**2 * np.log(200 * e / (np.pi * w**2 * threshold))  # J/cm^2 from uJ and um
for name, model, start in (("energy", by_energy, (20, 3)), ("fluence", by_fluence, (20, 0.5))):
    best, covariance = curve_fit(model, energies_uj, diameters_um**2, p0=start, xtol=1e-14, ftol=1e-14)
    print(name, best, np.sqrt(np.diag(covariance)))
