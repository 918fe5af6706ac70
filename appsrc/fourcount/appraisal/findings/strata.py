"""Several strata beside what pools them."""

from __future__ import annotations

import msgspec

from fourcount.appraisal.findings.figures import AnyNumberNeeded, Figure, Probability
from fourcount.stats.results import Counts, Gap


class Homogeneity(msgspec.Struct, frozen=True, kw_only=True):
    """Whether the strata's odds ratios may be one and the same: chi-square, its degrees of freedom, and p."""

    method: str
    chi_square: float
    degrees: int
    p: float


class Interaction(msgspec.Struct, frozen=True, kw_only=True):
    """How far two strata's effects are apart: the first ratio over the second, the first difference less the second.

    ``p`` is two-sided, of no difference between the two.
    """

    figure: Figure
    p: float


class StratumFindings(msgspec.Struct, frozen=True, kw_only=True):
    """One stratum: its label (or its number), its counts, and the crude measures in it."""

    label: str
    counts: Counts
    measures: dict[str, Figure | AnyNumberNeeded | Gap]


class StrataFindings(msgspec.Struct, frozen=True, kw_only=True):
    """Several strata beside what pools them.

    ``pooled`` has the keys of ``POOLED_MEASURES``; the crude measures stand in ``OutcomeFindings.measures``.
    ``test`` is Cochran-Mantel-Haenszel's. ``parting`` lists the measures whose crude value differs from the pooled one
    by more than a tenth or points the other way. ``interactions`` has, for exactly two strata, the measures of
    ``POOLED_MEASURES`` that the design gives, each the one stratum's effect against the other's.
    """

    strata: tuple[StratumFindings, ...]
    pooled: dict[str, Figure | Gap]
    test: Probability | Gap
    homogeneity: Homogeneity | Gap
    parting: tuple[str, ...] = ()
    interactions: dict[str, Interaction | Gap] = {}
