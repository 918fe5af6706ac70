"""Make oracle_carrying.json: what follows from an effect at a starting risk where no source prints a figure.

    python tests/reference/make_carrying_oracle.py

takes some seconds and writes the file beside itself. All figures are at 50 digits, by formulas written here a second
time: the overall risk is solved by bisection, and of the circle of two estimates (the method of Newcombe 2011, Commun
Stat Theory Methods 40:3154) every side is searched, without knowing where the extremes lie.
"""

from __future__ import annotations

import json
from collections.abc import Callable
from importlib.metadata import version
from pathlib import Path
from typing import Any

from mpmath import mp, mpf

mp.dps = 50
TARGET = Path(__file__).parent / "oracle_carrying.json"
DESCRIPTION = (
    "Figures of effects carried to a starting risk that no source prints: at 50 digits by make_carrying_oracle.py, 17 "
    "of them kept. source is that of the formula or the method, and has no such figure."
)
ALTMAN = "Altman DG, Andersen PK (1999) BMJ 319:1492-1495, formula"
ZHANG = "Zhang J, Yu KF (1998) JAMA 280:1690-1691, equation"
MIXTURE = "the mixture (1-e) p0 + e p1"
NEWCOMBE = "Newcombe RG (2011) Commun Stat Theory Methods 40:3154-3172, method"
STEPS = 360

CARRY: dict[str, Callable[[Any, Any], Any]] = {
    "risk_ratio": lambda q, e: q * e,
    "odds_ratio": lambda q, e: q * e / (1 - q + q * e),
    "hazard_ratio": lambda q, e: 1 - (1 - q) ** e,
    "risk_difference": lambda q, e: q + e,
}


def hazard(value: str, surviving: str) -> dict[str, Any]:
    """The number needed under a hazard ratio where so many of the controls survive."""
    left = mpf(surviving)
    return {"number_needed": 1 / (left ** mpf(value) - left)}


def converted(odds_ratio: str, start: str) -> dict[str, Any]:
    """An odds ratio as a risk ratio."""
    q, e = mpf(start), mpf(odds_ratio)
    return {"risk_ratio": CARRY["odds_ratio"](q, e) / q}


def overall(measure: str, effect: str, overall: str, exposed: str) -> dict[str, Any]:
    """The starting risk at which both groups together have the overall risk."""
    share, low, high = mpf(exposed), mpf(0), mpf(1)
    for _ in range(200):
        middle = (low + high) / 2
        mixed = (1 - share) * middle + share * CARRY[measure](middle, mpf(effect))
        low, high = (middle, high) if mixed < mpf(overall) else (low, middle)
    return {"start": (low + high) / 2}


def propagated(effect: str, estimate: str, low: str, high: str, events: int, total: int) -> dict[str, Any]:
    """Least and greatest difference over the circle at 95%."""
    z, p, n, centre = mp.sqrt(2) * mp.erfinv(mpf("0.95")), mpf(events) / total, mpf(total), mpf(estimate)

    def difference(angle: Any) -> Any:
        reach = z * mp.sin(angle)
        start = (p + reach**2 / (2 * n) + reach * mp.sqrt(p * (1 - p) / n + reach**2 / (4 * n**2))) / (1 + reach**2 / n)
        share, limit = mp.cos(angle), mpf(high) if mp.cos(angle) > 0 else mpf(low)
        return CARRY[effect](start, centre * mp.exp(mp.log(limit / centre) * abs(share))) - start

    return {"lower": -_greatest(lambda angle: -difference(angle)), "upper": _greatest(difference)}


def _greatest(height: Callable[[Any], Any]) -> Any:
    """The greatest height on the circle: the best of a grid, refined by thirds."""
    best = max(range(STEPS), key=lambda step: height(2 * mp.pi * step / STEPS))
    left, right = 2 * mp.pi * (best - 1) / STEPS, 2 * mp.pi * (best + 1) / STEPS
    for _ in range(120):
        third = (right - left) / 3
        if height(left + third) < height(right - third):
            left += third
        else:
            right -= third
    return height((left + right) / 2)


CASES: tuple[tuple[str, Callable[..., dict[str, Any]], str, dict[str, Any]], ...] = (
    ("hazard", hazard, ALTMAN, {"value": "0.55", "surviving": "0.33"}),
    ("hazard", hazard, ALTMAN, {"value": "0.92", "surviving": "0.33"}),
    ("risk-ratio-from-odds-ratio", converted, ZHANG, {"odds_ratio": "0.6", "start": "0.906"}),
    ("risk-ratio-from-odds-ratio", converted, ZHANG, {"odds_ratio": "3", "start": "0.1"}),
    ("risk-ratio-from-odds-ratio", converted, ZHANG, {"odds_ratio": "0.5", "start": "0.5"}),
    *(
        ("overall", overall, MIXTURE, {"measure": measure, "effect": effect, "overall": risk, "exposed": share})
        for measure, effect, risk, share in (
            ("odds_ratio", "2.5", "0.08", "0.35"),
            ("odds_ratio", "0.4", "0.6", "0.2"),
            ("risk_ratio", "1.8", "0.12", "0.25"),
            ("hazard_ratio", "3.2", "0.3", "0.4"),
            ("hazard_ratio", "0.35", "0.02", "0.7"),
            ("risk_difference", "0.05", "0.1", "0.3"),
        )
    ),
    *(
        (
            "propagated",
            propagated,
            NEWCOMBE,
            {"effect": effect, "estimate": estimate, "low": low, "high": high, "events": events, "total": total},
        )
        for effect, estimate, low, high, events, total in (
            ("risk_ratio", "0.6", "0.4", "0.9", 24, 200),
            ("odds_ratio", "0.49", "0.32", "0.75", 30, 120),
            ("hazard_ratio", "1.4", "1.1", "1.9", 9, 300),
            ("risk_ratio", "0.92", "0.8", "1.05", 300, 1000),
        )
    ),
)
"""The kind of a figure, the function that gives it, its source and what goes into it."""


def entries() -> list[dict[str, Any]]:
    """Every case with its figures."""
    return [
        {
            "kind": kind,
            "inputs": inputs,
            "figures": {name: mp.nstr(value, 17) for name, value in function(**inputs).items()},
            "source": source,
        }
        for kind, function, source, inputs in CASES
    ]


def main() -> None:
    """Write the file."""
    made = {"description": DESCRIPTION, "computed_with": {"mpmath": version("mpmath")}, "entries": entries()}
    TARGET.write_text(json.dumps(made, indent=1, ensure_ascii=False) + "\n", encoding="utf-8")


if __name__ == "__main__":
    main()
