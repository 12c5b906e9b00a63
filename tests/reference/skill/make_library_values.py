"""Scores of an independent library (hydroeval 0.1.0, PyPI; numpy 2.4.6) on the columns of the independent run.

Modelled is `q_routed` of reference_daily.csv; observed is the same times a fixed pattern, so that the two differ in a
known way. Run in this folder: python make_library_values.py
"""
import csv
import math
from importlib.metadata import version

import hydroeval
import numpy

with open("../reference_daily.csv") as source:
    modelled = numpy.array([float(row["q_routed_mm"]) for row in csv.DictReader(source)])
observed = numpy.array([q * (1.1 + 0.3 * math.sin(0.05 * day)) + 0.02 for day, q in enumerate(modelled)])
r = {}
r["nse"] = hydroeval.evaluator(hydroeval.nse, modelled, observed)[0]
r["nse_of_roots"] = hydroeval.evaluator(hydroeval.nse, modelled, observed, transform="sqrt")[0]
kge = hydroeval.evaluator(hydroeval.kge, modelled, observed)[:, 0]
r["kge2009"], r["kge2009_r"], r["kge2009_alpha"], r["kge2009_beta"] = kge
prime = hydroeval.evaluator(hydroeval.kgeprime, modelled, observed)[:, 0]
r["kge2012"], r["kge2012_r"], r["kge2012_gamma"], r["kge2012_beta"] = prime
r["rmse"] = hydroeval.evaluator(hydroeval.rmse, modelled, observed)[0]
r["pbias"] = hydroeval.evaluator(hydroeval.pbias, modelled, observed)[0]
with open("library_values.toml", "w") as out:
    out.write(f'# Made by make_library_values.py.\nlibrary = "hydroeval {version("hydroeval")}"\nnumpy = "{version("numpy")}"\n\n[scores]\n')
    for key, value in r.items():
        out.write(f"{key} = {float(value)!r}\n")
