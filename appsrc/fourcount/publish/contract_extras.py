"""What stands beside a table's measures as other programs read it; a part that nobody would look for is left out."""

from __future__ import annotations

from fourcount.appraisal.findings import (
    Clusters,
    EValues,
    Extras,
    Figure,
    Fragility,
    Gap,
    Losses,
    LossScenario,
    PrintedFigure,
    Recovered,
)
from fourcount.publish.contract_figures import Json, figure_json, value_json, withheld_json
from fourcount.record.entry.readings import PrintedNumber

Part = (
    EValues | Fragility | Losses | Figure | Clusters | Recovered | PrintedFigure
)  # what a field of the extras can hold beside a reason or nothing


def extras_json(extras: Extras) -> Json:
    """Every part that is there, by the name of its field."""
    parts = {name: getattr(extras, name) for name in extras.__struct_fields__}
    return {name: _part(part) for name, part in parts.items() if part is not None}


def _part(part: Part | Gap) -> Json:
    if isinstance(part, Gap):
        return withheld_json(part)
    if isinstance(part, Figure):
        return figure_json(part)
    if isinstance(part, EValues):
        return _e_values(part)
    if isinstance(part, Losses):
        return _losses(part)
    if isinstance(part, PrintedFigure):
        return printed_figure_json(part)
    return {name: _plain(getattr(part, name)) for name in part.__struct_fields__}


def _plain(value: object) -> object:
    return value_json(value) if isinstance(value, float) else value


def _e_values(found: EValues) -> Json:
    return {
        "estimate": value_json(found.estimate),
        "limit": value_json(found.limit),
        "of": found.measure,
        "adjusted": found.adjusted,
        "converted_from": found.converted or None,
    }


def _losses(found: Losses) -> Json:
    return {
        "index_lost": found.index_lost,
        "reference_lost": found.reference_lost,
        "index_ratio": value_json(found.index_ratio),
        "reference_ratio": value_json(found.reference_ratio),
        "scenarios": {scenario.key: _scenario(scenario) for scenario in found.scenarios},
        "overturned": list(found.overturned),
    }


def _scenario(scenario: LossScenario) -> Json:
    return {
        "risk_index": value_json(scenario.risk_index),
        "risk_reference": value_json(scenario.risk_reference),
        "risk_difference": figure_json(scenario.difference),
        "risk_ratio": figure_json(scenario.risk_ratio),
    }


def printed_figure_json(printed: PrintedFigure) -> Json:
    """A printed effect with its numbers in the print's own unit."""
    return {
        "measure": printed.measure,
        "text": printed.text,
        "estimate": _number(printed.estimate),
        "low": _number(printed.low),
        "high": _number(printed.high),
        "level": printed.level,
        "p": _number(printed.p),
        "p_relation": printed.p_relation,
        "unit": printed.unit,
        "adjusted": printed.adjusted,
    }


def _number(number: PrintedNumber | None) -> object:
    return None if number is None else value_json(number.value)
