"""The entries of what is carried to a patient and of margins, and what importing the functions behind them costs."""

from __future__ import annotations

import subprocess
import sys

from fourcount.stats.methods import CARRYING, EXTRAS, MARGINS, RECOVERIES

KEYS = (
    "carried-risk-ratio",
    "carried-odds-ratio",
    "carried-hazard-ratio",
    "carried-rate-ratio",
    "carried-difference",
    "risk-ratio-from-odds-ratio",
    "propagated",
    "starting-risk-overall",
    "risk-from-rate",
    "other-span",
)
MARGIN_KEYS = ("margin-score", "margin-printed")
WITHOUT_NUMPY = """
import sys
from fourcount.stats import conversion, hazards, margins, methods, overall_risk, propagation
from fourcount.stats.results import Counts, Interval
counts = Counts(index_events=3, index_non_events=7, reference_events=5, reference_non_events=5)
margins.margin_p("risk_ratio", counts, 1.2, "more")
start = propagation.limits_of_counts(3, 20)
propagation.propagated("hazard_ratio", 0.7, Interval(low=0.5, high=0.98), 0.95, start)
overall_risk.starting_risk_from_overall("hazard_ratio", 2.0, 0.1, 0.3)
print(sorted({name.split(".")[0] for name in sys.modules} & {"numpy", "scipy"}))
"""


def test_every_entry_says_what_it_is() -> None:
    """Each key stands once among all calculations, and title, formula, source and note are there."""
    assert tuple(entry.key for entry in CARRYING) == KEYS
    assert tuple(entry.key for entry in MARGINS) == MARGIN_KEYS
    every = [entry.key for entry in (*CARRYING, *MARGINS, *EXTRAS, *RECOVERIES)]
    assert len(every) == len(set(every))
    for entry in (*CARRYING, *MARGINS):
        assert all((entry.title, entry.formula, entry.source, entry.note)), entry.key


def test_carrying_loads_no_numpy() -> None:
    """A patient's figures are there before numpy is: nothing behind them needs it, not even when called."""
    found = subprocess.run([sys.executable, "-c", WITHOUT_NUMPY], capture_output=True, text=True, check=True)
    assert found.stdout.strip() == "[]"
