"""When the cautions of single forms of print, and of what stands beside a table, hold."""

from __future__ import annotations

from fourcount.appraisal.case import Case, Facts, value
from fourcount.appraisal.extras.printed import level_of
from fourcount.appraisal.findings import Clusters, Figure, Gap, Losses, PrintedFigure, Recovered, TimedRisks
from fourcount.stats.strata_sums import informative, smallest_expected

UNLIKE = 0.1
"""A p of homogeneity below this speaks of unlike strata: such tests find little, so papers often take 10% (common
practice)."""


FEW_EXPECTED = 5
A_FIFTH = 0.2
"""Chi-square tests are shaky where more than a fifth of the expected counts lie below five (Cochran 1954, Biometrics
10:417, from memory); here a stratum counts as such by the least of its four."""


def strata_part(case: Case) -> tuple[Facts, ...]:
    """The crude difference or risk ratio is another than the pooled one, which confounding can do."""
    return _parting(case, ("pooled_risk_difference", "pooled_risk_ratio"))


def strata_odds_ratio_parts(case: Case) -> tuple[Facts, ...]:
    """The crude odds ratio alone is another than the pooled one, which needs no confounding."""
    return () if strata_part(case) else _parting(case, ("pooled_odds_ratio",))


def _parting(case: Case, measures: tuple[str, ...]) -> tuple[Facts, ...]:
    parts: list[Facts] = []
    for key in measures:
        crude, pooled = value(case.figures.get(key.removeprefix("pooled_"))), value(case.figures.get(key))
        if case.pooled is None or key not in case.pooled.parting or crude is None or pooled is None:
            continue
        parts.append({"measure": key.removeprefix("pooled_"), "crude": crude, "pooled": pooled})
    return tuple(parts)


def strata_unlike(case: Case) -> Facts | None:
    """The strata's odds ratios differ by more than chance easily explains, so that one pooled figure hides it."""
    found = None if case.pooled is None else case.pooled.homogeneity
    if found is None or isinstance(found, Gap) or found.p >= UNLIKE:
        return None
    return {"p": found.p}


def strata_small(case: Case) -> Facts | None:
    """In too many strata few people are expected with the event or without it: a test of likeness says little there."""
    if case.pooled is None or isinstance(case.pooled.homogeneity, Gap):
        return None
    told = informative([stratum.counts for stratum in case.pooled.strata])
    small = sum(smallest_expected(counts) < FEW_EXPECTED for counts in told)
    return {"small": small, "strata": len(told)} if small > A_FIFTH * len(told) else None


def no_meta_analysis(case: Case) -> Facts | None:
    """Strata of one study are pooled; several studies are not to be pooled so."""
    return {"strata": len(case.pooled.strata)} if case.pooled is not None and len(case.pooled.strata) > 1 else None


def follow_up_varied(case: Case) -> Facts | None:
    """People were followed for different times, so that raw counts are no risks over one time."""
    return {} if case.outcome.follow_up_varied and not isinstance(case.given, PrintedFigure) else None


def losses_overturn(case: Case) -> Facts | None:
    """If those lost had fared otherwise, the interval would tell something else about no effect."""
    losses = case.extras.losses
    if not isinstance(losses, Losses) or not losses.overturned:
        return None
    return {
        "lost": losses.index_lost + losses.reference_lost,
        "index_lost": losses.index_lost,
        "reference_lost": losses.reference_lost,
        "scenarios": ", ".join(losses.overturned),
    }


def randomised_differs(case: Case) -> tuple[Facts, ...]:
    """A group's people in the table and those lost are not the people randomised."""
    return tuple(
        {
            "group": group.group,
            "label": group.label,
            "randomised": group.randomised,
            "analysed": group.analysed,
            "lost": 0 if group.lost is None else group.lost,
        }
        for group in case.randomised
    )


def cluster_without_icc(case: Case) -> Facts | None:
    """Clusters were allotted and how alike their people are is not known: no interval and no p."""
    clusters = case.extras.clusters
    return {"reason": clusters.key} if isinstance(clusters, Gap) else None


def cluster_corrected(case: Case) -> Facts | None:
    """Intervals and p are those of so many fewer people."""
    clusters = case.extras.clusters
    if not isinstance(clusters, Clusters) or clusters.design_effect == 1:
        return None
    return {"design_effect": clusters.design_effect, "icc": clusters.icc, "mean_size": clusters.mean_size}


def cluster_uncorrected(case: Case) -> Facts | None:
    """Clusters are spoken of in a form that has no correction for them."""
    return {} if isinstance(case.extras.clusters, Clusters) else None


def before_after(case: Case) -> Facts | None:
    """Nobody tells what would have happened without the treatment."""
    return {} if case.outcome.design == "before-after" else None


def abstract_only(case: Case) -> Facts | None:
    """The reader took the numbers from the abstract."""
    return {} if case.outcome.where == "abstract" else None


def events_counted(case: Case) -> Facts | None:
    """Several events may be one person's: they are not independent, and intervals are too narrow."""
    return {} if case.outcome.counting == "events" else None


def hazard_ratio(case: Case) -> Facts | None:
    """A hazard ratio is a ratio of rates that is taken to stay the same over time; ``carried`` says that it is used."""
    printed = case.given if isinstance(case.given, PrintedFigure) else case.extras.adjusted
    if printed is None or printed.measure != "hazard_ratio" or printed.estimate is None:
        return None
    figure = case.figures.get("hazard_ratio")
    shown = printed.estimate.value if figure is None or isinstance(figure.estimate, Gap) else figure.estimate
    used = case.carried is not None and case.carried.effect == "hazard_ratio"
    return {"value": shown, "carried": "hazard_ratio"} if used else {"value": shown}


def cannot_be_checked(case: Case) -> Facts | None:
    """Without counts nothing can be worked out anew."""
    return {} if isinstance(case.given, PrintedFigure) else None


def interval_rebuilt(case: Case) -> Facts | None:
    """The interval was worked out from the printed p."""
    recovered, printed = case.extras.recovered, case.given
    if not isinstance(recovered, Recovered) or not recovered.from_p:
        return None
    return {"p": printed.p.value} if isinstance(printed, PrintedFigure) and printed.p is not None else None


def printed_level(case: Case) -> Facts | None:
    """Printed limits, and those rebuilt from a printed p, have a level of their own, which is not the record's."""
    given = case.given
    if isinstance(given, TimedRisks):
        level = given.level
    elif isinstance(given, PrintedFigure) and isinstance(case.extras.recovered, Recovered):
        level = level_of(given)
    else:
        return None
    return None if abs(level - case.choices.level) < 1e-9 else {"level": level, "chosen": case.choices.level}


def concordant_unknown(case: Case) -> Facts | None:
    """Only the discordant pairs are typed, so that nothing but the odds ratio follows."""
    return {} if isinstance(case.given, Gap) and isinstance(case.figures.get("pair_odds_ratio"), Figure) else None
