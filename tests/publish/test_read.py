"""A pasted text in, a dictionary out. All texts are invented."""

from __future__ import annotations

import json
from typing import Any

import pytest

import fourcount
from fourcount.publish.read import read
from pastes import cases

SENTENCE = (
    "Falls occurred in 38 of 412 patients (9.2%) with night lights and 70 of 409 (17.1%) with usual care "
    "(relative risk, 0.54; 95% CI, 0.37 to 0.78; P = 0.001)"
)


def test_it_is_reached_from_the_package() -> None:
    """The package offers the function by name."""
    assert fourcount.read is read


def test_a_sentence_gives_counts_labels_and_the_printed_figure() -> None:
    """Everything that a sentence prints of its two groups is published."""
    published: Any = read(SENTENCE)
    assert published["form"] == "events-of-total"
    assert published["groups"] == [
        {"label": "night lights", "cells": ["38", "412"], "events": 38, "non_events": 374, "total": 412},
        {"label": "usual care", "cells": ["70", "409"], "events": 70, "non_events": 339, "total": 409},
    ]
    assert published["words"] == "falls"
    assert published["ambiguous"] == []
    [figure] = published["printed"]
    assert figure == {
        "says": "relative risk, 0.54; 95% CI, 0.37 to 0.78; P = 0.001",
        "measure": "risk_ratio",
        "estimate": 0.54,
        "low": 0.37,
        "high": 0.78,
        "level": 0.95,
        "p": 0.001,
        "p_relation": "=",
        "unit": "one",
        "adjusted": False,
    }


def test_text_without_a_table_is_said_to_have_none() -> None:
    """No table is a dictionary too, with the form None."""
    assert read("The dose was 5 mg.") == {"format": 1, "form": None, "groups": [], "printed": [], "ambiguous": []}


@pytest.mark.parametrize("text", [text for text, _ in [*cases("blocks.txt"), *cases("sentences.txt")]])
def test_every_understanding_is_strict_json(text: str) -> None:
    """What is published has no nan, no infinity and no type of our own in it."""
    published = read(text)
    assert json.loads(json.dumps(published, allow_nan=False)) == published


def test_counts_of_both_outcomes_give_the_total() -> None:
    """Events beside non-events give the same counts as events beside a total."""
    published: Any = read("\tDied\tSurvived\nLamp\t38\t374\nTorch\t70\t339")
    assert [group["total"] for group in published["groups"]] == [412, 409]


def test_anything_but_text_is_refused() -> None:
    """A number or bytes are no text to be read."""
    with pytest.raises(TypeError, match="str"):
        read(38)  # type: ignore[arg-type]
