"""What stands under the fold of a table."""

from __future__ import annotations

from typing import Literal

import msgspec

from fourcount.appraisal.findings.figures import Figure
from fourcount.record.entry.readings import PrintedFigure
from fourcount.stats.results import Gap


class EValues(msgspec.Struct, frozen=True, kw_only=True):
    """The E-value of the estimate and of the limit nearest no effect.

    ``measure`` is the ratio that it is of, ``adjusted`` whether that is the printed adjusted one. ``converted`` is
    "odds_ratio" or "hazard_ratio" where such a ratio of a common outcome was turned into a risk ratio first; ``ratio``
    is what the formula took.
    """

    ratio: float
    estimate: float
    limit: float | Gap
    converted: str = ""
    measure: str = "risk_ratio"
    adjusted: bool = False


class Fragility(msgspec.Struct, frozen=True, kw_only=True):
    """How many people of one group would have to change outcome for Fisher's p to reach 0.05, beside those lost."""

    changes: int
    group: Literal["index", "reference"]
    p_before: float
    p_after: float
    lost: int | None


class LossScenario(msgspec.Struct, frozen=True, kw_only=True):
    """The table if the people lost had fared as the scenario says: "none", "all", "worst", "best" or "ratio"."""

    key: Literal["none", "all", "worst", "best", "ratio"]
    risk_index: float
    risk_reference: float
    difference: Figure
    risk_ratio: Figure


class Losses(msgspec.Struct, frozen=True, kw_only=True):
    """How many were lost, and what each scenario would make of the table; ``overturned`` lists the scenarios whose
    interval of the difference tells something else about no effect than the table's own."""

    index_lost: int
    reference_lost: int
    index_ratio: float
    reference_ratio: float
    scenarios: tuple[LossScenario, ...]
    overturned: tuple[str, ...]


class Clusters(msgspec.Struct, frozen=True, kw_only=True):
    """The design effect of a cluster trial: the counts behind every interval are divided by it."""

    icc: float
    mean_size: float
    design_effect: float


class Recovered(msgspec.Struct, frozen=True, kw_only=True):
    """What follows from a printed effect alone: the standard error on its scale (log for ratios), z and p.

    ``from_p`` says that the interval was rebuilt from the printed p (Altman and Bland 2011), which is approximate.
    """

    standard_error: float
    z: float
    p: float
    log_scale: bool
    from_p: bool = False


class Extras(msgspec.Struct, frozen=True, kw_only=True):
    """What stands under the fold. A Gap says why a part is not given; None where nobody would look for it.

    ``prevented_exposed`` is there where the exposed fare better, and ``attributable_exposed`` then is a Gap.
    """

    e_value: EValues | Gap | None = None
    fragility: Fragility | Gap | None = None
    losses: Losses | Gap | None = None
    attributable_exposed: Figure | Gap | None = None
    prevented_exposed: Figure | None = None
    attributable_population: Figure | Gap | None = None
    clusters: Clusters | Gap | None = None
    recovered: Recovered | Gap | None = None
    adjusted: PrintedFigure | None = None
