"""Every text and every line that carries a meaning can be told from what it stands on."""

from __future__ import annotations

import re

import pytest
from PySide6.QtGui import QColor

from fourcount.ink.palette import DARK, HIGH_DARK, HIGH_LIGHT, LIGHT, PAPER, Palette, contrast, relative_luminance

HIGH = [pytest.param(HIGH_LIGHT, id="high-light"), pytest.param(HIGH_DARK, id="high-dark")]
PALETTES = [
    pytest.param(LIGHT, id="light"),
    pytest.param(DARK, id="dark"),
    pytest.param(PAPER, id="paper"),
    *HIGH,
]
TEXT = 4.5  # WCAG 2.2, success criterion 1.4.3
GRAPHICS = 3.0  # WCAG 2.2, success criterion 1.4.11
ENHANCED = 7.0  # WCAG 2.2, success criterion 1.4.6


@pytest.mark.parametrize("palette", PALETTES)
@pytest.mark.parametrize("ground", ["page", "tint"])
@pytest.mark.parametrize("text", ["ink", "muted"])
def test_text_can_be_read(palette: Palette, text: str, ground: str) -> None:
    """Text has 4.5:1 on the page and on a tint."""
    assert contrast(getattr(palette, text), getattr(palette, ground)) >= TEXT


@pytest.mark.parametrize("palette", PALETTES)
@pytest.mark.parametrize("text", ["accent", "caution"])
def test_text_in_colour_can_be_read(palette: Palette, text: str) -> None:
    """Commands in the accent's colour and sentences in the caution's are text too: 4.5:1 on the page."""
    assert contrast(getattr(palette, text), palette.page) >= TEXT


@pytest.mark.parametrize("palette", PALETTES)
def test_text_on_the_accent_can_be_read(palette: Palette) -> None:
    """Selected text has 4.5:1 on the accent."""
    assert contrast(palette.on_accent, palette.accent) >= TEXT


@pytest.mark.parametrize("palette", PALETTES)
@pytest.mark.parametrize("part", ["outline", "caution", "accent"])
def test_graphics_can_be_seen(palette: Palette, part: str) -> None:
    """Edges of fields, icons, marks and strips have 3:1 on the page."""
    assert contrast(getattr(palette, part), palette.page) >= GRAPHICS


@pytest.mark.parametrize("palette", HIGH)
def test_high_contrast_is_higher(palette: Palette) -> None:
    """Text has 7:1 wherever it stands, edges and marks have as much, and even a hairline can be seen."""
    texts = [contrast(getattr(palette, part), palette.page) for part in ("ink", "muted", "accent", "caution")]
    on_tint = [contrast(getattr(palette, part), palette.tint) for part in ("ink", "muted")]
    assert min(texts + on_tint + [contrast(palette.on_accent, palette.accent)]) >= ENHANCED
    assert contrast(palette.outline, palette.page) >= ENHANCED
    assert contrast(palette.hairline, palette.page) >= GRAPHICS


@pytest.mark.parametrize("palette", PALETTES)
def test_colours_are_written_in_full(palette: Palette) -> None:
    """Every colour is #RRGGBB, so that the measured one is the painted one."""
    assert all(re.fullmatch("#[0-9A-F]{6}", colour) for colour in palette)


def test_paper_is_white() -> None:
    """A picture that leaves the window is dark on white."""
    assert PAPER.page == "#FFFFFF"
    assert relative_luminance(PAPER.ink) < relative_luminance(PAPER.page)


@pytest.mark.parametrize(
    ("one", "other", "ratio"),
    [("#000000", "#FFFFFF", 21.0), ("#FFFFFF", "#FFFFFF", 1.0), ("#767676", "#FFFFFF", 4.54)],
)
def test_contrast_is_that_of_the_guidelines(one: str, other: str, ratio: float) -> None:
    """Black on white is 21:1, a colour on itself 1:1, and #767676 the palest grey that passes (WCAG 2.2)."""
    assert contrast(one, other) == pytest.approx(ratio, abs=0.005)
    assert contrast(other, one) == contrast(one, other)


@pytest.mark.parametrize("palette", PALETTES)
def test_no_colour_of_a_picture_alarms_or_approves(palette: Palette) -> None:
    """Icons are blue and grey: no red, no amber, no green, which would judge what the numbers leave to the reader."""
    accent, outline = QColor(palette.accent), QColor(palette.outline)
    assert 180 <= accent.hslHue() <= 250
    assert outline.hslSaturation() < 40
