"""What statsmodels and scipy answer for one table, or why they refuse.

A warning counts as a refusal: a library that warns says that it does not stand by its figure. The limits of a
score interval are put back into the score statistic, at 50 digits; a limit that does not solve it is a refusal.
"""

from __future__ import annotations

import math
import warnings
from collections.abc import Callable
from dataclasses import dataclass

import numpy as np
from fifty_digits import difference, odds, ratio
from fifty_digits.common import quantile
from mpmath import mpf
from scipy.stats import chi2, chi2_contingency, contingency, fisher_exact
from statsmodels.stats.proportion import confint_proportions_2indep, proportion_confint

Table = tuple[int, int, int, int, float]
Pair = tuple[float, float]
Answer = Callable[[Table], Pair | float]


class RefusedError(Exception):
    """The library gives nothing for this table; the text is the kind of refusal."""


@dataclass(frozen=True, kw_only=True)
class Library:
    """Where a figure comes from, how to ask for it, and how to check its limits (none: a closed form)."""

    call: str
    answer: Answer
    statistic: Callable[..., mpf] | None = None
    factor: bool = False


def _risk(method: str) -> Library:
    def answer(table: Table) -> Pair:
        a, b, _c, _d, level = table
        if method == "normal" and 0 in (a, b):
            raise RefusedError("zero width")
        if method == "jeffreys" and 0 in (a, b):
            raise RefusedError("other definition at 0 and n")
        low, high = proportion_confint(a, a + b, alpha=1 - level, method=method)
        if method == "normal" and (low == 0 or high == 1):
            raise RefusedError("clipped to 0 or 1")
        return low, high

    return Library(call=f"statsmodels proportion_confint(method={method!r})", answer=answer)


def _two(
    compare: str,
    method: str,
    statistic: Callable[..., mpf] | None = None,
    factor: bool = False,
    at_zeros: str = "",
    zeros: str = "abcd",
) -> Library:
    """Two groups by statsmodels; ``at_zeros`` is its adjusted method, asked where one of ``zeros`` is 0."""

    def answer(table: Table) -> Pair:
        a, b, c, d, level = table
        if compare == "diff" and method == "wald" and 0 in (a, b) and 0 in (c, d):
            raise RefusedError("zero width")
        if compare == "ratio" and method == "log" and b == d == 0:
            raise RefusedError("zero width")
        used = at_zeros if at_zeros and 0 in [dict(zip("abcd", table, strict=False))[key] for key in zeros] else method
        return confint_proportions_2indep(
            a, a + b, c, c + d, alpha=1 - level, method=used, compare=compare, correction=factor
        )

    call = f"statsmodels confint_proportions_2indep(compare={compare!r}, method={method!r}, correction={factor})"
    if at_zeros:
        call += f"; {at_zeros!r} where one of {zeros} is 0"
    return Library(call=call, answer=answer, statistic=statistic, factor=factor)


def _conditional_exact(table: Table) -> Pair:
    a, b, c, d, level = table
    if a == c == 0 or b == d == 0:
        raise RefusedError("one outcome only")
    interval = contingency.odds_ratio([[a, b], [c, d]]).confidence_interval(level)
    return interval.low, interval.high


def _conditional_estimate(table: Table) -> float:
    a, b, c, d, _level = table
    return float(contingency.odds_ratio([[a, b], [c, d]]).statistic)


def _fisher(table: Table) -> float:
    a, b, c, d, _level = table
    return float(fisher_exact([[a, b], [c, d]]).pvalue)


def _pearson(table: Table) -> float:
    a, b, c, d, _level = table
    return float(chi2_contingency([[a, b], [c, d]], correction=False).pvalue)


def _n_minus_1(table: Table) -> float:
    a, b, c, d, _level = table
    total = a + b + c + d
    statistic = chi2_contingency([[a, b], [c, d]], correction=False).statistic
    return float(chi2.sf(statistic * (total - 1) / total, 1))


LIBRARIES: dict[str, Library] = {
    "risk/wald": _risk("normal"),
    "risk/wilson": _risk("wilson"),
    "risk/agresti-coull": _risk("agresti_coull"),
    "risk/clopper-pearson": _risk("beta"),
    "risk/jeffreys": _risk("jeffreys"),
    "risk_difference/wald": _two("diff", "wald"),
    "risk_difference/newcombe": _two("diff", "newcomb"),
    "risk_difference/agresti-caffo": _two("diff", "agresti-caffo"),
    "risk_difference/miettinen-nurminen": _two("diff", "score", difference.difference_statistic, True),
    "risk_difference/mee": _two("diff", "score", difference.difference_statistic),
    "risk_ratio/katz": _two("ratio", "log", at_zeros="log-adjusted", zeros="ac"),
    "risk_ratio/miettinen-nurminen": _two("ratio", "score", ratio.ratio_statistic, True),
    "risk_ratio/koopman": _two("ratio", "score", ratio.ratio_statistic),
    "odds_ratio/woolf": _two("odds-ratio", "logit", at_zeros="logit-adjusted"),
    "odds_ratio/gart": _two("odds-ratio", "logit-adjusted"),
    "odds_ratio/miettinen-nurminen": _two("odds-ratio", "score", odds.odds_statistic, True),
    "odds_ratio/cornfield": _two("odds-ratio", "score", odds.odds_statistic),
    "odds_ratio/conditional-exact": Library(
        call="scipy.stats.contingency.odds_ratio().confidence_interval", answer=_conditional_exact
    ),
    "conditional-odds-ratio": Library(call="scipy.stats.contingency.odds_ratio", answer=_conditional_estimate),
    "test/fisher": Library(call="scipy.stats.fisher_exact", answer=_fisher),
    "test/pearson": Library(call="scipy.stats.chi2_contingency(correction=False)", answer=_pearson),
    "test/n-minus-1": Library(
        call="scipy.stats.chi2_contingency(correction=False), statistic times (N-1)/N", answer=_n_minus_1
    ),
}
"""The methods that a general-purpose library has."""


def ask(library: Library, table: Table) -> Pair | float:
    """The library's figure, checked; raises ``RefusedError`` with the kind of refusal."""
    with warnings.catch_warnings():
        warnings.simplefilter("ignore" if library.statistic else "error")
        try:
            answer = library.answer(table)
        except Warning:
            raise RefusedError("warning") from None
        except RefusedError:
            raise
        except (ValueError, RuntimeError, ArithmeticError, np.linalg.LinAlgError) as error:
            raise RefusedError("not converged" if isinstance(error, RuntimeError) else "exception") from None
    figures = list(answer) if isinstance(answer, tuple | list | np.ndarray) else [answer]
    if any(isinstance(value, complex) for value in figures):
        raise RefusedError("complex number")
    figures = [float(value) for value in figures]
    if any(math.isnan(value) for value in figures):
        raise RefusedError("nan")
    if len(figures) == 1:
        return figures[0]
    low, high = figures
    if library.statistic is not None:
        low, high = _checked(library, table, low, high)
    return low, high


def _checked(library: Library, table: Table, low: float, high: float) -> Pair:
    """The limits, if the score statistic is z at the lower and -z at the upper one, to six decimals.

    A ratio's lower limit is 0 where the index group has no event, its upper limit infinite where the reference
    group has none; neither solves an equation.
    """
    z, of_ratio = quantile(table[4]), library.statistic is not difference.difference_statistic
    if of_ratio and table[0] == 0 and abs(low) < 1e-9:
        low = 0.0
    elif not _solves(library, table, low, z):
        raise RefusedError("limits that do not solve the equation")
    if not (of_ratio and table[2] == 0 and high == math.inf) and not _solves(library, table, high, -z):
        raise RefusedError("limits that do not solve the equation")
    return low, high


def _solves(library: Library, table: Table, limit: float, wanted: mpf) -> bool:
    assert library.statistic is not None
    if library.statistic is difference.difference_statistic:
        possible = -1 <= limit <= 1
    else:
        possible = 0 < limit < math.inf
    return possible and bool(abs(library.statistic(*table[:4], mpf(limit), library.factor) - wanted) < 1e-6)
