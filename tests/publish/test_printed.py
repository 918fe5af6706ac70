"""The check of a print as other programs and a terminal read it. All tables are invented."""

from __future__ import annotations

import json
from typing import Any

import pytest

from fourcount import answer

FALLS = (38, 374, 70, 339)
KEYS = {"says", "as", "method", "level", "orientation", "fit", "computed", "text"}


def test_every_match_is_listed() -> None:
    """What the print says, what the figure is, by which method and at which level, from which side, and our digits."""
    published: Any = answer(*FALLS, printed="RR 0.54 (95% CI, 0.37 to 0.78)")
    matches = published["printed"]
    assert [match["method"] for match in matches] == ["katz", "koopman", "miettinen-nurminen"]
    first = matches[0]
    assert set(first) == KEYS
    assert (first["says"], first["as"], first["level"]) == ("risk_ratio", "risk_ratio", 0.95)
    assert (first["orientation"], first["fit"]) == ("as-read", "all")
    assert [first["computed"][name] for name in ("estimate", "low", "high")] == pytest.approx(
        [0.53890, 0.37206, 0.78056], abs=1e-5
    )
    assert published["adopt"] == {"intervals": "score", "level": 0.95}


def test_an_odds_ratio_called_a_risk_ratio() -> None:
    """``says`` and ``as`` part, and the sentence says so."""
    published: Any = answer(*FALLS, printed="RR 0.49 (0.32 to 0.75)")
    assert {(match["says"], match["as"]) for match in published["printed"]} == {("risk_ratio", "odds_ratio")}
    assert published["check"][0]["key"] == "other-name"
    assert not published["check"][0]["agrees"]


def test_percentages_are_published_as_fractions() -> None:
    """As everywhere in this dictionary."""
    published: Any = answer(*FALLS, printed="risk difference -7.9 percentage points (-12.5 to -3.3)")
    assert published["printed"][0]["computed"]["estimate"] == pytest.approx(-0.0789161, abs=1e-7)


def test_an_estimate_alone_has_no_method() -> None:
    """Nor a level."""
    published: Any = answer(*FALLS, printed="RR 0.54")
    assert (published["printed"][0]["method"], published["printed"][0]["level"]) == (None, None)


def test_a_correction_in_use_is_published() -> None:
    """Katz's interval with a half added, since a count is 0."""
    published: Any = answer(0, 14, 117, 92, printed="RR 0.000 (99% CI, 0.002 to 2.212)")
    first = published["printed"][0]
    assert (first["method"], first["adjusted"]) == ("katz", "half")
    assert set(first) == KEYS | {"adjusted"}


def test_an_infinite_limit_is_no_obstacle() -> None:
    """It fits nothing finite, and the answer stays strict JSON."""
    published: Any = answer(*FALLS, printed="OR 2.5 (0.9 to ∞)")
    assert published["check"][0]["text"].startswith("Check 2.5 (0.9 to ∞): ")


def test_nothing_printed_adds_nothing() -> None:
    """Without the option, and with a text that says nothing, the dictionary is the one it was."""
    assert answer(*FALLS, printed="") == answer(*FALLS)
    assert not {"printed", "check", "adopt"} & set(answer(*FALLS))


def test_a_text_that_cannot_be_read_is_marked_and_the_rest_goes_on() -> None:
    """The figures of the counts stand as ever."""
    published: Any = answer(*FALLS, printed="as reported previously")
    assert published["printed"] == []
    assert published["check"][0]["text"]
    assert published["measures"] == answer(*FALLS)["measures"]


@pytest.mark.parametrize("design", ["case-control", "cohort"])
def test_an_unnamed_figure_is_of_the_designs_own_measure(design: str) -> None:
    """A case-control study prints odds ratios, the others risk ratios."""
    published: Any = answer(*FALLS, design=design, printed="0.49 (0.32 to 0.75)")
    says = "odds_ratio" if design == "case-control" else "risk_ratio"
    assert published["printed"][0]["says"] == says


@pytest.mark.parametrize("text", ["RR 0.54 (0.37 to 0.87); P=0.03", "NNT 13 (8 to 31)", "9.3% vs 17.1%", "HR 0.5"])
@pytest.mark.parametrize("cells", [FALLS, (0, 10, 0, 10), (0, 10, 5, 5), (10**9, 1, 1, 10**9)])
def test_it_is_strict_json(cells: tuple[int, ...], text: str) -> None:
    """No nan and no infinity as such, whatever the table."""
    json.dumps(answer(*cells, printed=text), allow_nan=False)
