"""Several strata as other programs read them: the pooled measures, the tests, and every stratum."""

from __future__ import annotations

from fourcount.appraisal.findings import (
    Counts,
    Gap,
    Homogeneity,
    Interaction,
    Probability,
    StrataFindings,
    StratumFindings,
)
from fourcount.publish.contract_figures import Json, figure_json, measure_json, value_json, withheld_json


def strata_json(strata: StrataFindings | Gap) -> Json:
    """Pooled measures, Cochran, Mantel and Haenszel's p, whether one odds ratio may hold, and the strata themselves."""
    if isinstance(strata, Gap):
        return withheld_json(strata)
    return {
        "pooled": {key: measure_json(figure) for key, figure in strata.pooled.items()},
        "test": _test(strata.test),
        "homogeneity": _homogeneity(strata.homogeneity),
        "parting": list(strata.parting),
        "interactions": {key: _interaction(found) for key, found in strata.interactions.items()},
        "strata": [_stratum(stratum) for stratum in strata.strata],
    }


def _test(test: Probability | Gap) -> Json:
    if isinstance(test, Gap):
        return withheld_json(test)
    return {"p": value_json(test.p), "method": test.method}


def _homogeneity(found: Homogeneity | Gap) -> Json:
    if isinstance(found, Gap):
        return withheld_json(found)
    return {"p": found.p, "chi_square": value_json(found.chi_square), "degrees": found.degrees, "method": found.method}


def _interaction(found: Interaction | Gap) -> Json:
    if isinstance(found, Gap):
        return withheld_json(found)
    return {**figure_json(found.figure), "p": value_json(found.p)}


def _stratum(stratum: StratumFindings) -> Json:
    return {
        "label": stratum.label,
        "counts": _counts(stratum.counts),
        "measures": {key: measure_json(measure) for key, measure in stratum.measures.items()},
    }


def _counts(counts: Counts) -> Json:
    return {
        "index_events": counts.index_events,
        "index_non_events": counts.index_non_events,
        "reference_events": counts.reference_events,
        "reference_non_events": counts.reference_non_events,
    }
