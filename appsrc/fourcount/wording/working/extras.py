"""The working of what stands under the fold: its formula, its source, and the reader's numbers in it."""

from __future__ import annotations

from fourcount.appraisal.findings import Clusters, EValues, Fragility, Gap, Losses, OutcomeFindings, Recovered
from fourcount.record.paper import Choices
from fourcount.stats.entries.entry import Calculation
from fourcount.stats.entries.extras import EXTRAS
from fourcount.stats.entries.recovery import RECOVERIES
from fourcount.wording import numbers
from fourcount.wording.numbers import plain, quantity
from fourcount.wording.working.parts import Row, about

CALCULATIONS: dict[str, Calculation] = {entry.key: entry for entry in (*EXTRAS, *RECOVERIES)}
ENTRIES = {
    "attributable_exposed": "attributable-exposed",
    "attributable_population": "attributable-population",
    "e_value": "e-value",
    "fragility": "fragility",
    "clusters": "design-effect",
    "losses": "losses",
}
CONVERSIONS = {"odds_ratio": "e-value-odds", "hazard_ratio": "e-value-hazards"}


def extra_rows(key: str, findings: OutcomeFindings, _choices: Choices) -> tuple[Row, ...]:
    """The rows of one line under the fold."""
    if key == "recovered":
        return tuple(recovered_rows(findings))
    name = key.partition(".")[0]
    entry = CALCULATIONS.get(ENTRIES.get(name, ""))
    return (*_numbers(name, findings), *([] if entry is None else about(entry)))


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
        *about(entry),
    ]


def _numbers(name: str, findings: OutcomeFindings) -> list[Row]:
    extras = findings.extras
    if name == "clusters" and isinstance(extras.clusters, Clusters):
        found = extras.clusters
        formula = f"1 + ({quantity(found.mean_size)} − 1) × {quantity(found.icc)} = {plain(found.design_effect)}"
        return [("Design effect", formula)]
    if name == "e_value" and isinstance(extras.e_value, EValues):
        limit = extras.e_value.limit
        rows = [("E-value", plain(extras.e_value.estimate))]
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
