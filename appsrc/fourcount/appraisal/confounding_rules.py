"""When the cautions about confounding hold: groups that were found and not made, crude figures and adjusted ones."""

from __future__ import annotations

from fourcount.appraisal.case import Case, Facts, at_start
from fourcount.appraisal.extras.printed import is_adjusted
from fourcount.appraisal.findings import PrintedFigure
from fourcount.appraisal.gating import OBSERVATIONAL


def observational(case: Case) -> Facts | None:
    """The groups were not made alike by chance, and the figures are crude, or pooled over strata at the most.

    With ``beside`` an adjusted effect stands beside them. With ``effect`` a crude one, which has no other caution of
    its own, is carried to a starting risk.
    """
    if case.outcome.design not in OBSERVATIONAL or _adjusted_print(case):
        return None
    facts: Facts = {"design": case.outcome.design, **_strata(case)}
    if _beside(case) is not None:
        return {**facts, "beside": "adjusted"}
    return {**facts, **_crude_carried(case)}


def adjusted_effect(case: Case) -> Facts | None:
    """An effect outside trials that stands alone was adjusted, for what the authors measured and no more."""
    if case.outcome.design not in OBSERVATIONAL or not _adjusted_print(case):
        return None
    return {"design": case.outcome.design, "adjusted_for": _adjusted_for(case)}


def crude_beside_adjusted(case: Case) -> Facts | None:
    """Outside trials the paper prints an adjusted effect, and the figures here are crude.

    With ``effect`` a crude one is carried all the same, and with ``carriable`` the adjusted one could be instead.
    """
    printed = _beside(case)
    if printed is None or printed.estimate is None or case.outcome.design not in OBSERVATIONAL:
        return None
    facts: Facts = {"measure": printed.measure, "value": printed.estimate.text, "adjusted_for": _adjusted_for(case)}
    if printed.unit != "one":
        facts["print_unit"] = printed.unit
    carried = _crude_carried(case)
    if carried and any(one.adjusted for one in case.reader.carriable):
        carried["carriable"] = "adjusted"
    return {**facts, **_strata(case), **carried}


def _beside(case: Case) -> PrintedFigure | None:
    """The adjusted effect that is printed beside the counts."""
    printed = case.extras.adjusted
    return None if printed is None or printed.estimate is None else printed


def _crude_carried(case: Case) -> Facts:
    """The effect and the starting risk, where it is a crude one that is carried."""
    carried = case.carried
    return {} if carried is None or carried.adjusted else {"effect": carried.effect, **at_start(carried)}


def _adjusted_print(case: Case) -> bool:
    """Whether the table is an effect that was adjusted for something."""
    return isinstance(case.given, PrintedFigure) and is_adjusted(case.given, case.outcome)


def _adjusted_for(case: Case) -> str:
    return " ".join(case.outcome.adjusted_for_text.split())


def _strata(case: Case) -> Facts:
    """How many strata are pooled, where any are: then not all figures are crude."""
    return {} if case.pooled is None else {"strata": len(case.pooled.strata)}
