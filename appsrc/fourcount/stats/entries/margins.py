"""The one-sided tests of a margin that the reader draws. Farrington and Manning are cited from memory."""

from __future__ import annotations

from fourcount.stats.entries.entry import Calculation

MARGINS = (
    Calculation(
        key="margin-score",
        title="Miettinen–Nurminen one-sided p of a margin",
        formula=(
            "The normal tail of the measure’s score statistic at the margin M: for a difference "
            "(p1 − p2 − M)/√((P1(1−P1)/n1 + P2(1−P2)/n2) N/(N−1)), P1 and P2 the likeliest risks under M"
        ),
        source="Miettinen and Nurminen 1985, Stat Med 4:213; Farrington and Manning 1990, Stat Med 9:1447",
        note=(
            "Of the hypothesis that the effect is the margin’s or worse. Below 0.025 exactly where Miettinen and "
            "Nurminen’s own 95% interval lies wholly on the better side of the margin; another one may disagree."
        ),
    ),
    Calculation(
        key="margin-printed",
        title="One-sided p of a margin from an interval",
        formula=(
            "The normal tail of z |estimate − M|/|estimate − limit|, of the limit on the margin’s side; "
            "on the log scale for ratios"
        ),
        source="Altman and Bland 2011, BMJ 343:d2304, at another value than no effect",
        note="For effects without four counts behind them. As rough as the printed limits.",
    ),
)
"""Tests of a margin."""
