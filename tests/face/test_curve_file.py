"""The curve leaves its window: as a file with its cautions, as a picture, and where it cannot with a sentence."""

from __future__ import annotations

from collections.abc import Iterator
from pathlib import Path
from typing import TYPE_CHECKING

import pytest
from PySide6.QtCore import QSaveFile
from PySide6.QtGui import QGuiApplication

from curve_hands import ODDS, choose, curve_shown, drawn
from fourcount.face import curve_file
from fourcount.face.curve_window import CurveWindow
from fourcount.wording import curve_labels as labels

if TYPE_CHECKING:
    from conftest import Hands


@pytest.fixture
def shown(example: Hands) -> Iterator[CurveWindow]:
    """The curve of the worked example's counts."""
    with curve_shown(example) as opened:
        yield opened


@pytest.mark.parametrize(("name", "begins"), [("a.png", b"\x89PNG"), ("a.svg", b"<?xml"), ("a.pdf", b"%PDF")])
def test_it_is_saved_with_its_cautions(
    example: Hands, shown: CurveWindow, monkeypatch: pytest.MonkeyPatch, tmp_path: Path, name: str, begins: bytes
) -> None:
    """The suffix decides the kind; the file is named in a sentence."""
    monkeypatch.setattr(curve_file, "ask_path", lambda parent: str(tmp_path / name))
    example.click(shown.save)
    assert shown.notice.text() == labels.SAVED.format(name=name)
    data = (tmp_path / name).read_bytes()
    assert data.startswith(begins)
    if name == "a.svg":
        assert b"Does not recommend" in data


def test_a_file_has_the_cautions_of_its_own_view(
    example: Hands, shown: CurveWindow, monkeypatch: pytest.MonkeyPatch, tmp_path: Path
) -> None:
    """The odds ratio as a risk ratio is not told that the risk ratio is kept."""
    example.window.session.edit_text("starting_risk_text", "5%")
    monkeypatch.setattr(curve_file, "ask_path", lambda parent: str(tmp_path / "a.svg"))
    choose(example, shown, ODDS)
    example.click(shown.save)
    text = " ".join((tmp_path / "a.svg").read_text(encoding="utf-8").split())
    assert "The odds ratio is kept the same at every starting risk." in text
    assert "outside half to twice" in text
    assert "assumed to be the same" not in text


def test_a_folder_that_cannot_be_written_is_a_sentence(
    example: Hands, shown: CurveWindow, monkeypatch: pytest.MonkeyPatch, tmp_path: Path
) -> None:
    """Nothing is written, nothing lost, and the next try works."""
    (tmp_path / "a file").write_text("mine", encoding="utf-8")
    monkeypatch.setattr(curve_file, "ask_path", lambda parent: str(tmp_path / "a file" / "curve.png"))
    example.click(shown.save)
    assert shown.notice.text().startswith("The curve could not be saved in ")
    assert (tmp_path / "a file").read_text(encoding="utf-8") == "mine"
    monkeypatch.setattr(curve_file, "ask_path", lambda parent: str(tmp_path / "curve.png"))
    example.click(shown.save)
    assert (tmp_path / "curve.png").exists()


def test_a_full_disk_is_a_sentence(monkeypatch: pytest.MonkeyPatch, tmp_path: Path) -> None:
    """A write that stops in its middle leaves what was there before and says what may be the matter."""

    class Full(QSaveFile):
        def write(self, data: bytes) -> int:
            return len(data) // 2

    (tmp_path / "curve.png").write_bytes(b"before")
    monkeypatch.setattr(curve_file, "QSaveFile", Full)
    said = curve_file.write(str(tmp_path / "curve.png"), b"after")
    assert said.endswith(": the disk may be full.")
    assert (tmp_path / "curve.png").read_bytes() == b"before"


def test_another_kind_of_file_is_a_sentence(
    example: Hands, shown: CurveWindow, monkeypatch: pytest.MonkeyPatch, tmp_path: Path
) -> None:
    """A name that ends in none of the three kinds writes nothing."""
    monkeypatch.setattr(curve_file, "ask_path", lambda parent: str(tmp_path / "curve.xls"))
    example.click(shown.save)
    assert "curve.xls ends in none of these" in shown.notice.text()
    assert list(tmp_path.glob("curve*")) == []


def test_a_save_that_is_called_off_says_nothing(
    example: Hands, shown: CurveWindow, monkeypatch: pytest.MonkeyPatch
) -> None:
    """Nothing chosen, nothing done."""
    monkeypatch.setattr(curve_file, "ask_path", lambda parent: "")
    example.click(shown.save)
    assert shown.notice.text() == ""


def test_it_is_copied_as_a_picture(example: Hands, shown: CurveWindow) -> None:
    """On white, whatever the window looks like, with twice the pixels."""
    example.window.look.set_appearance("dark")
    drawn(example, shown)
    example.click(shown.copy)
    image = QGuiApplication.clipboard().image()
    assert image.width() == 2 * curve_file.WIDTH
    assert image.pixelColor(2, 2).name() == "#ffffff"
    assert shown.notice.text() == labels.COPIED


def test_what_is_told_ends_with_the_next_change(example: Hands, shown: CurveWindow) -> None:
    """A notice about a copy says nothing of a changed record."""
    example.click(shown.copy)
    example.window.session.edit_text("first_left_text", "40")
    assert shown.notice.text() == ""


def test_a_name_without_a_suffix_gets_that_of_its_kind(shown: CurveWindow, monkeypatch: pytest.MonkeyPatch) -> None:
    """The kind that was chosen in the question decides, a typed suffix goes first."""
    ask = "fourcount.face.curve_file.QFileDialog.getSaveFileName"
    monkeypatch.setattr(ask, lambda *rest: ("/x/curve", labels.FILTERS[".pdf"]))
    assert curve_file.ask_path(shown) == "/x/curve.pdf"
    monkeypatch.setattr(ask, lambda *rest: ("/x/curve.svg", labels.FILTERS[".pdf"]))
    assert curve_file.ask_path(shown) == "/x/curve.svg"
    monkeypatch.setattr(ask, lambda *rest: ("", ""))
    assert curve_file.ask_path(shown) == ""
