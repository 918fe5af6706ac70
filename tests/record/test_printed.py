"""Printed results as figures. All texts are invented."""

from __future__ import annotations

import pytest

from fourcount.record.entry.printed import PAPER_MARKS, read_paper
from fourcount.record.entry.readings import PrintedFigure
from pastes import cases, figure_line

# text, then for each figure: measure, estimate, low, high, level, p, relation, unit, adjusted
FIGURES = [
    ("0.54 (0.37 to 0.78), P = 0.001", [("risk_ratio", "0.54", "0.37", "0.78", None, "0.001", "=", "one", False)]),
    ("RR 1.50 (1.12-2.01)", [("risk_ratio", "1.50", "1.12", "2.01", None, None, "=", "one", False)]),
    ("aOR 2.3; 90% CI 1.1, 4.8", [("odds_ratio", "2.3", "1.1", "4.8", 0.9, None, "=", "one", True)]),
    ("HR, 0.72 [95% CI, 0.55–0.92]", [("hazard_ratio", "0.72", "0.55", "0.92", 0.95, None, "=", "one", False)]),
    (
        "-7·9% (−12·6 to –3·3)",
        [("risk_difference", "-7·9", "-12·6", "-3·3", None, None, "=", "percent", False)],
    ),
    (
        "risk difference 7.9 percentage points (3.3 to 12.6)",
        [("risk_difference", "7.9", "3.3", "12.6", None, None, "=", "percent", False)],
    ),
    ("mean difference 3.2 (1.1 to 5.0)", []),
    ("P<.001", [("p", None, None, None, None, ".001", "<", "one", False)]),
    ("0,54 (0,37-0,78)", [("risk_ratio", "0,54", "0,37", "0,78", None, None, "=", "one", False)]),
    (
        "9.2% v 17.1%",
        [
            ("risk", "9.2", None, None, None, None, "=", "percent", False),
            ("risk", "17.1", None, None, None, None, "=", "percent", False),
        ],
    ),
    (
        "The adjusted hazard ratio for death within 12 months was 0.72 (P=0.03; 95 percent CI, 0.5 to 0.9)",
        [("hazard_ratio", "0.72", "0.5", "0.9", 0.95, "0.03", "=", "one", True)],
    ),
]


def seen(figure: PrintedFigure) -> tuple[object, ...]:
    """A figure as the list above writes it."""
    numbers = [number and number.text for number in (figure.estimate, figure.low, figure.high)]
    p = figure.p and figure.p.text
    return (figure.measure, *numbers, figure.level, p, figure.p_relation, figure.unit, figure.adjusted)


@pytest.mark.parametrize(("text", "expected"), FIGURES, ids=[text for text, _ in FIGURES])
def test_a_printed_result_is_read_with_its_name_limits_level_and_p(text: str, expected: list[object]) -> None:
    """Each printed result gives the figure that a reader would see in it."""
    assert [seen(figure) for figure in read_paper(text, "risk_ratio").figures] == expected


def test_the_marks_are_the_listed_ones() -> None:
    """A doubtful text is marked with one of the listed keys and is used where it can be."""
    doubtful = {
        "gibberish": "paper-unreadable",
        "mean difference 3.2 (1.1 to 5.0)": "paper-measure",
        "RR 0.54 (0.12)": "paper-one-limit",
        "RR 0.54 (0.78 to 0.37)": "paper-limits-order",
        "RR 0.34 (0.37 to 0.78)": "paper-limits-outside",
        "RR 0.54 (30% CI 0.37 to 0.78)": "paper-level",
        "RR 0.54 (0.37 to 0.78), P = 1.2": "paper-p",
        "x" * 20_000: "paper-too-long",
        "RR 0.54 (0.37 to 0.78) 12 13 RR 0.5": "paper-leftover",
    }
    assert {text: [mark.key for mark in read_paper(text, "risk_ratio").marks][:1] for text in doubtful} == {
        text: [key] for text, key in doubtful.items()
    }
    assert set(doubtful.values()) <= set(PAPER_MARKS)


@pytest.mark.parametrize(("text", "expected"), cases("printed.txt"), ids=[text for text, _ in cases("printed.txt")])
def test_results_in_the_manner_of_many_papers_are_read(text: str, expected: list[str]) -> None:
    """Commas, semicolons, brackets of all kinds, levels before and behind, units and exponents are all understood."""
    reading = read_paper(text, "risk_ratio")
    figures = [f"figure: {figure_line(figure)}" for figure in reading.figures]
    assert [*figures, *(f"mark: {mark.key}" for mark in reading.marks)] == expected


@pytest.mark.parametrize("text", ["P for interaction = 0.32", "OR >100", "see Table 2 of 3", ""])
def test_what_is_no_result_gives_none(text: str) -> None:
    """The p of an interaction, a bound and a page are no results of the comparison."""
    assert not read_paper(text, "risk_ratio").figures
