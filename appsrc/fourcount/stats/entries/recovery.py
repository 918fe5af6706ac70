"""What follows from printed intervals alone: the standard error and p behind one, and whether two of them differ."""

from __future__ import annotations

from fourcount.stats.entries.entry import Calculation

RECOVERIES = (
    Calculation(
        key="recovery-limits",
        title="Standard error and p of a printed interval",
        formula=(
            "Ratios: error = ln(U/L)/(2z), ln(estimate)/error is a normal value; "
            "differences: error = (U − L)/(2z), estimate/error is one"
        ),
        source="Altman and Bland 2011, BMJ 343:d2304",
        note=(
            "Holds for an interval that reaches equally far to both sides (a ratio’s on the log scale), to the digits "
            "printed. The normal tail in full, not the paper’s approximation."
        ),
    ),
    Calculation(
        key="recovery-p",
        title="Interval of a printed p",
        formula=(
            "error = |ln(estimate)|/zp for ratios, |estimate|/zp for differences, zp the normal value whose two-sided "
            "p is printed; estimate ∓ z error, on the log scale for ratios"
        ),
        source="Altman and Bland 2011, BMJ 343:d2090",
        note=(
            "As rough as the printed p; a p given as a bound, or of another test, gives another interval. "
            "The normal quantile in full, not the paper’s approximation."
        ),
    ),
    Calculation(
        key="interaction",
        title="Difference of two independent effects",
        formula=(
            "Ratios: r1/r2 exp(∓ z √(e1² + e2²)), (ln r1 − ln r2)/√(e1² + e2²) is a normal value; each e is the error "
            "of its own interval on the log scale. Differences: the same without logarithms"
        ),
        source="Altman and Bland 2003, BMJ 326:219",
        note=(
            "The two effects come from different people. Finds little where the intervals are wide. Of counts, each "
            "interval is the textbook one (Wald, Katz, Woolf), whichever family is chosen."
        ),
    ),
)
