"""The working of what stands under the fold: its formula, its source, and the reader's numbers in it."""

from __future__ import annotations

from math import isinf

from fourcount.appraisal.findings import (
    Clusters,
    Counts,
    EValues,
    Figure,
    Fragility,
    Gap,
    Interval,
    Losses,
    OutcomeFindings,
    PrintedFigure,
    Recovered,
)
from fourcount.record.outcome import Form
from fourcount.record.paper import USUAL_LEVEL, Choices
from fourcount.stats.attributable import levin, levin_interval
from fourcount.stats.entries.carrying import CARRYING
from fourcount.stats.entries.entry import Calculation
from fourcount.stats.entries.extras import EXTRAS
from fourcount.stats.entries.margins import MARGINS
from fourcount.stats.entries.recovery import RECOVERIES
from fourcount.stats.recovery import approximate_from_p, approximate_p
from fourcount.wording import limits, numbers
from fourcount.wording.extras import fraction_below_none
from fourcount.wording.form import measure_of
from fourcount.wording.numbers import plain, quantity, whole
from fourcount.wording.printed import PER_UNIT
from fourcount.wording.working.parts import ESTIMATE, OTHER_METHODS, SPACE, Row, about, interval_words

CALCULATIONS: dict[str, Calculation] = {entry.key: entry for entry in (*EXTRAS, *RECOVERIES, *CARRYING, *MARGINS)}
ENTRIES = {
    "attributable_exposed": "attributable-exposed",
    "prevented_exposed": "prevented-exposed",
    "attributable_population": "attributable-population",
    "e_value": "e-value",
    "fragility": "fragility",
    "clusters": "design-effect",
    "losses": "losses",
}
RATIOS: dict[Form, str] = {"person-time": "rate_ratio", "strata": "pooled_risk_ratio"}
"""The ratio that a form's fractions are of, where it is not the risk ratio."""

FRACTIONS = ("attributable_exposed", "prevented_exposed", "attributable_population")
APPROXIMATE_P = "p by the approximation exp(−0.717 z − 0.416 z²)"
APPROXIMATE_INTERVAL = "Interval by the approximation zp = −0.862 + √(0.743 − 2.404 ln p)"
CONVERSIONS = {"odds_ratio": "e-value-odds", "hazard_ratio": "e-value-hazards"}


def extra_rows(key: str, findings: OutcomeFindings, _choices: Choices) -> tuple[Row, ...]:
    """The rows of one line under the fold."""
    if key == "recovered":
        return tuple(recovered_rows(findings))
    name = key.partition(".")[0]
    entry = CALCULATIONS.get(ENTRIES.get(name, ""))
    rows = _fraction(name, findings) if name in FRACTIONS else _numbers(name, findings)
    rows += _put_back(key, findings)
    rows += [] if entry is None else about(entry)
    return (*rows, *(_levin(findings) if name == "attributable_population" else ()))


def recovered_rows(findings: OutcomeFindings) -> list[Row]:
    """The standard error, z and p that belong to a printed effect."""
    found = findings.extras.recovered
    if not isinstance(found, Recovered):
        return []
    entry = CALCULATIONS["recovery-p" if found.from_p else "recovery-limits"]
    return [
        ("Standard error", plain(found.standard_error)),
        ("z", plain(found.z, 2)),
        ("p", numbers.p_value(found.p)),
        *_approximately(found, findings),
        *about(entry),
    ]


def _approximately(found: Recovered, findings: OutcomeFindings) -> list[Row]:
    """What the paper's own formula, which a reader may follow with a pencil, makes of the same print."""
    if not found.from_p:
        return [(APPROXIMATE_P, numbers.p_value(approximate_p(found.z)))]
    printed = findings.given
    if not isinstance(printed, PrintedFigure) or printed.p is None:
        return []
    figure = measure_of(printed.measure, findings)
    if not isinstance(figure, Figure) or isinstance(figure.estimate, Gap):
        return []
    interval = approximate_from_p(
        figure.estimate, printed.p.value, printed.level or USUAL_LEVEL, log_scale=found.log_scale
    )
    per = PER_UNIT[printed.unit] if printed.measure == "rate_difference" else 1
    return [(APPROXIMATE_INTERVAL, interval_words(printed.measure, interval, figure, figure.method, per))]


def _fraction(name: str, findings: OutcomeFindings) -> list[Row]:
    """A fraction's formula with the ratio in it; that of the population with the share of the events as well."""
    ratio, found = _ratio(findings), getattr(findings.extras, name)
    if ratio is None or isinstance(ratio.estimate, Gap) or not isinstance(found, Figure):
        return []
    if isinstance(found.estimate, Gap):
        return []
    r, result = plain(ratio.estimate), plain(found.estimate)
    if name == "prevented_exposed":
        return [(ESTIMATE, f"1 − {r} = {result}")]
    share, counts = "", findings.counts
    if name == "attributable_population" and isinstance(counts, Counts):
        share = f"{whole(counts.index_events)}/{whole(counts.events)} × "
    return [(ESTIMATE, f"{share}({r} − 1)/{r} = {result}")]


def _levin(findings: OutcomeFindings) -> list[Row]:
    """Levin's form at the exposure of the table's own people, which is the same fraction, with his limits."""
    ratio, counts = _ratio(findings), findings.counts
    if ratio is None or isinstance(ratio.estimate, Gap) or isinstance(counts, Gap):
        return []
    if not isinstance(ratio.interval, Interval):
        return []
    exposed = counts.index_total / counts.total
    found = levin_interval(exposed, ratio.estimate, ratio.interval)
    if isinstance(found, Gap):
        return []
    words = fraction_below_none(found) or limits.percent_interval(found, levin(exposed, ratio.estimate))
    return [SPACE, ("", OTHER_METHODS), (CALCULATIONS["attributable-levin"].title, words)]


def _e_value(found: EValues) -> str:
    """``1.86 + √(1.86 × 0.86) = 3.12``, a ratio below 1 turned over first; nothing is to be worked out at the ends."""
    if found.ratio == 0 or isinf(found.ratio):
        return plain(found.estimate)
    r = max(found.ratio, 1 / found.ratio)
    turned = f"1/{plain(found.ratio)} = {plain(r)}; " if found.ratio < 1 else ""
    return f"{turned}{plain(r)} + √({plain(r)} × {plain(r - 1)}) = {plain(found.estimate)}"


def _put_back(key: str, findings: OutcomeFindings) -> list[Row]:
    """Both groups' risks in one scenario of those lost: events and people, the lost among them."""
    losses, counts = findings.extras.losses, findings.counts
    if not isinstance(losses, Losses) or isinstance(counts, Gap):
        return []
    scenario = next((one for one in losses.scenarios if key == f"losses.{one.key}"), None)
    if scenario is None:
        return []
    reference, index = counts.reference_total + losses.reference_lost, counts.index_total + losses.index_lost
    return [
        ("Risk, reference group", _share(scenario.risk_reference, reference)),
        ("Risk, index group", _share(scenario.risk_index, index)),
    ]


def _share(risk: float, people: int) -> str:
    """``58/432 = 0.1343``; a share of the people lost need not be whole people."""
    return f"{quantity(round(risk * people, 2))}/{whole(people)} = {plain(risk)}"


def _ratio(findings: OutcomeFindings) -> Figure | None:
    found = measure_of(RATIOS.get(findings.form, "risk_ratio"), findings)
    return found if isinstance(found, Figure) else None


def _numbers(name: str, findings: OutcomeFindings) -> list[Row]:
    extras = findings.extras
    if name == "clusters" and isinstance(extras.clusters, Clusters):
        found = extras.clusters
        formula = f"1 + ({quantity(found.mean_size)} − 1) × {quantity(found.icc)} = {plain(found.design_effect)}"
        return [("Design effect", formula)]
    if name == "e_value" and isinstance(extras.e_value, EValues):
        limit = extras.e_value.limit
        rows = [("E-value", _e_value(extras.e_value))]
        rows += [] if isinstance(limit, Gap) else [("Of the limit nearest no effect", plain(limit))]
        conversion = CALCULATIONS.get(CONVERSIONS.get(extras.e_value.converted, ""))
        return [*rows, *([] if conversion is None else [("Converted first", conversion.formula)])]
    if name == "fragility" and isinstance(extras.fragility, Fragility):
        return [
            ("p as counted", numbers.p_value(extras.fragility.p_before)),
            ("p with those changes", numbers.p_value(extras.fragility.p_after)),
        ]
    if name == "losses" and isinstance(extras.losses, Losses):
        return [
            ("Lost, index group", numbers.whole(extras.losses.index_lost)),
            ("Lost, reference group", numbers.whole(extras.losses.reference_lost)),
        ]
    return []
