"""The window of the handout: ticks, preview, files, printer, and sentences for what fails."""

from __future__ import annotations

from collections.abc import Callable, Iterator
from pathlib import Path

import pytest
from msgspec.structs import replace
from PySide6.QtCore import QSaveFile, Qt
from PySide6.QtPrintSupport import QPrinter
from PySide6.QtTest import QTest
from pytestqt.qtbot import QtBot

from fourcount.face import handout_dialogs, page_file
from fourcount.face.handout_window import HandoutWindow, open_handout
from fourcount.face.window import MainWindow
from fourcount.ink.handout import Handout, NoPage
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Record
from patient_outcomes import AT_TWELVE, HARM, HAZARD, TRIAL, WELCOME

UNNAMED = replace(TRIAL, span_text="", name_text="Sleep")
SEVERAL = Record(title_text="Night lights", outcomes=(AT_TWELVE, HARM, UNNAMED, WELCOME))

Opened = Callable[..., tuple[MainWindow, HandoutWindow]]


@pytest.fixture
def opened(open_window: Callable[..., MainWindow], qtbot: QtBot) -> Iterator[Opened]:
    """A window on a record, with its handout open."""
    made: list[HandoutWindow] = []

    def make(record: Record = SEVERAL) -> tuple[MainWindow, HandoutWindow]:
        window = open_window(record)
        handout = open_handout(window)
        assert handout is not None
        qtbot.waitUntil(handout.isVisible)
        made.append(handout)
        return window, handout

    yield make
    for handout in made:
        with qtbot.waitSignal(handout.destroyed):
            handout.close()


@pytest.fixture
def save_as(monkeypatch: pytest.MonkeyPatch) -> Callable[[HandoutWindow, Path | str], str]:
    """Save under a path as the dialog would give it, and read the sentence that follows."""

    def save(handout: HandoutWindow, path: Path | str) -> str:
        monkeypatch.setattr(handout_dialogs, "ask_path", lambda parent, name: str(path))
        QTest.mouseClick(handout.save, Qt.MouseButton.LeftButton)
        return handout.notice.text()

    return save


def names_on(handout: HandoutWindow) -> list[str]:
    """The outcomes ticked."""
    return [tick.text() for tick in handout._ticks if tick.isChecked()]


def page(handout: HandoutWindow) -> Handout:
    """The page in the preview."""
    assert isinstance(handout.page, Handout)
    return handout.page


def test_it_shows_the_outcomes_that_are_ready(opened: Opened) -> None:
    """All ready ones are ticked; the unfinished one cannot be, and the window says why."""
    _, handout = opened()
    assert names_on(handout) == ["Falls", "Bleeding", "Healing"]
    assert [tick.isEnabled() for tick in handout._ticks] == [True, True, False, True]
    assert handout.notes.text() == "Sleep: Before a patient is shown this, fill in “Time span”."
    assert "6 fewer of these 100" in handout.preview.accessibleDescription()


def test_a_tick_is_a_step_that_can_be_undone(opened: Opened, qtbot: QtBot) -> None:
    """Unticking leaves the outcome out of record and page; undo brings both back."""
    window, handout = opened()
    QTest.mouseClick(handout._ticks[1], Qt.MouseButton.LeftButton)
    assert not window.session.record.outcomes[1].on_handout
    assert "Bleeding" not in page(handout).words.description
    window.session.undo()
    assert window.session.record.outcomes[1].on_handout
    qtbot.waitUntil(lambda: names_on(handout) == ["Falls", "Bleeding", "Healing"])


def test_nothing_ticked_is_said(opened: Opened) -> None:
    """Without a tick there is no page, nothing to save or print, and a sentence."""
    _, handout = opened(Record(outcomes=(TRIAL,)))
    QTest.mouseClick(handout._ticks[0], Qt.MouseButton.LeftButton)
    assert isinstance(handout.page, NoPage)
    assert handout.notice.text() == "Tick at least one outcome for the page."
    assert not handout.save.isEnabled()
    assert not handout.print.isEnabled()


def test_too_many_are_refused_until_enough_are_unticked(opened: Opened) -> None:
    """The sentence says how many fit; with so many the page is there again."""
    _, handout = opened(Record(outcomes=(AT_TWELVE, HARM, WELCOME, HAZARD) * 3))
    assert "fit on one page" in handout.notice.text()
    for tick in handout._ticks[int(handout.notice.text()[0]) :]:
        QTest.mouseClick(tick, Qt.MouseButton.LeftButton)
    assert isinstance(handout.page, Handout)
    assert handout.notice.text() == ""


def test_what_is_ticked_and_no_longer_ready_says_what_it_lacks(opened: Opened, qtbot: QtBot) -> None:
    """Where the last outcome of the page loses its time span, the time span is asked for and not another tick."""
    window, handout = opened(Record(outcomes=(TRIAL,)))
    window.session.edit_text("span_text", "")
    qtbot.waitUntil(lambda: isinstance(handout.page, NoPage))
    assert "fill in “Time span”" in handout.notice.text()
    assert "Tick" not in handout.notice.text()


def test_the_range_is_one_tick_away(opened: Opened) -> None:
    """Off at first; ticked, every outcome's range is said on the page, and the record is as it was."""
    window, handout = opened()
    before, record = page(handout).words.description, window.session.record
    assert not handout.range.isChecked()
    assert "it could be from" not in before
    QTest.mouseClick(handout.range, Qt.MouseButton.LeftButton)
    assert page(handout).words.description.count("it could be from") == 3
    assert window.session.record == record
    QTest.mouseClick(handout.range, Qt.MouseButton.LeftButton)
    assert page(handout).words.description == before


@pytest.mark.parametrize("zooms", [(1.0, 2.0), (2.0, 1.0)], ids=str)
def test_the_preview_follows_the_text_size(opened: Opened, zooms: tuple[float, float]) -> None:
    """After another text size the page fills what the panel beside it leaves, and nothing of it is cut off."""
    window, handout = opened()
    handout.resize(980, 700)
    for zoom in zooms:
        window.look.set_zoom(zoom)
        room = handout._scroll.width() - handout._scroll.verticalScrollBar().sizeHint().width()
        assert handout.preview.width() == max(room, 160)


@pytest.mark.parametrize(("width", "beside"), [(980, True), (700, True), (600, False), (480, False)])
def test_a_narrow_window_has_the_page_above_its_boxes(opened: Opened, width: int, beside: bool) -> None:
    """The page is never narrower than it can be read; the boxes then stand below it, and can be scrolled to."""
    _, handout = opened()
    handout.resize(width, 760)
    assert handout.preview.width() >= min(320, width - 40)
    assert (handout._side.y() == handout._scroll.y()) == beside
    assert handout._side.height() <= handout.height() * (1 if beside else 0.5)


def test_it_is_refused_where_no_outcome_is_ready(open_window: Callable[..., MainWindow]) -> None:
    """The window says what is missing from the outcome in view."""
    window = open_window(Record(outcomes=(UNNAMED, Outcome())))
    assert open_handout(window) is None
    assert "fill in “Time span”" in window.banner.words.text()


def test_the_same_window_comes_to_the_front(opened: Opened) -> None:
    """Asked for twice, there is one."""
    window, handout = opened()
    assert open_handout(window) is handout


def test_letter_paper_makes_another_page(opened: Opened) -> None:
    """The preview takes the shape of the paper that was chosen."""
    _, handout = opened()
    before = handout.preview.height() / handout.preview.width()
    handout.paper.setFocus()
    QTest.keyClick(handout.paper, Qt.Key.Key_Down)
    assert page(handout).paper.key == "letter"
    after = handout.preview.height() / handout.preview.width()
    assert (before, after) == (pytest.approx(297 / 210, abs=0.01), pytest.approx(279.4 / 215.9, abs=0.01))


def test_typing_in_the_window_changes_the_page(opened: Opened, qtbot: QtBot) -> None:
    """After a pause the page says what the record says."""
    window, handout = opened()
    window.session.edit_text("name_text", "Tumbles")
    qtbot.waitUntil(lambda: "Tumbles in 12 months" in page(handout).words.description)


@pytest.mark.parametrize(("suffix", "start"), [("pdf", b"%PDF"), ("png", b"\x89PNG"), ("svg", b"<?xml")])
def test_it_is_saved_as_the_name_asks(
    opened: Opened, save_as: Callable[..., str], tmp_path: Path, suffix: str, start: bytes
) -> None:
    """PDF, PNG and SVG, and one sentence that names the file."""
    _, handout = opened()
    path = tmp_path / f"page.{suffix}"
    assert save_as(handout, path) == f"The page is saved as page.{suffix}."
    assert path.read_bytes().startswith(start)


def test_what_was_just_typed_is_on_the_saved_page(opened: Opened, save_as: Callable[..., str], tmp_path: Path) -> None:
    """Saving does not wait for the pause after typing."""
    window, handout = opened()
    window.session.edit_text("name_text", "Tumbles")
    save_as(handout, tmp_path / "page.svg")
    assert "Tumbles" in (tmp_path / "page.svg").read_text(encoding="utf-8")


def test_a_folder_that_is_not_there_is_one_sentence(
    opened: Opened, save_as: Callable[..., str], tmp_path: Path
) -> None:
    """Nothing is lost, the record is as it was, and the window goes on."""
    window, handout = opened()
    record = window.session.record
    sentence = save_as(handout, tmp_path / "nowhere" / "page.pdf")
    assert sentence.startswith("The page could not be saved in")
    assert sentence.count(".") >= 1
    assert window.session.record == record
    assert isinstance(handout.page, Handout)


def test_a_kind_of_file_that_there_is_not_is_one_sentence(
    opened: Opened, save_as: Callable[..., str], tmp_path: Path
) -> None:
    """Another suffix is refused, and no file is made."""
    _, handout = opened()
    assert save_as(handout, tmp_path / "page.doc").startswith("The page can be saved as .pdf, .png or .svg")
    assert list(tmp_path.glob("page.*")) == []


def test_a_failed_save_leaves_the_old_file(
    opened: Opened, save_as: Callable[..., str], tmp_path: Path, monkeypatch: pytest.MonkeyPatch
) -> None:
    """A file in the way that cannot be replaced stays whole."""
    _, handout = opened()
    (tmp_path / "page.pdf").mkdir()
    assert save_as(handout, tmp_path / "page.pdf").startswith("The page could not be saved in")
    assert (tmp_path / "page.pdf").is_dir()


def test_a_full_disk_is_one_sentence(
    opened: Opened, save_as: Callable[..., str], tmp_path: Path, monkeypatch: pytest.MonkeyPatch
) -> None:
    """A write that stops in its middle leaves what was there before and says what may be the matter."""

    class Full(QSaveFile):
        def write(self, data: bytes) -> int:
            return len(data) // 2

    _, handout = opened()
    (tmp_path / "page.pdf").write_bytes(b"before")
    monkeypatch.setattr(page_file, "QSaveFile", Full)
    assert save_as(handout, tmp_path / "page.pdf").endswith(": the disk may be full.")
    assert (tmp_path / "page.pdf").read_bytes() == b"before"


def test_no_path_chosen_saves_nothing(opened: Opened, save_as: Callable[..., str]) -> None:
    """A dialog that was left changes nothing and says nothing."""
    _, handout = opened()
    assert save_as(handout, "") == ""


def test_it_goes_to_the_printer(opened: Opened, tmp_path: Path, monkeypatch: pytest.MonkeyPatch) -> None:
    """The printer gets one sheet, titled after the study; a printer that writes a file has its name told."""
    _, handout = opened()
    path = tmp_path / "printed.pdf"

    def choose(parent: object, printer: QPrinter) -> bool:
        printer.setOutputFormat(QPrinter.OutputFormat.PdfFormat)
        printer.setOutputFileName(str(path))
        assert printer.docName() == "Night lights"
        return True

    monkeypatch.setattr(handout_dialogs, "ask_printer", choose)
    QTest.mouseClick(handout.print, Qt.MouseButton.LeftButton)
    assert handout.notice.text() == "The page is saved as printed.pdf."
    data = path.read_bytes()
    assert data.startswith(b"%PDF")
    assert data.count(b"/MediaBox") == 1


@pytest.mark.qt_log_ignore(r"QPainter::begin\(\): Returned false", extend=True)  # Qt says so too, and only to the log
def test_a_printer_that_takes_nothing_is_one_sentence(opened: Opened, monkeypatch: pytest.MonkeyPatch) -> None:
    """What could not be printed is said."""
    _, handout = opened()

    def choose(parent: object, printer: QPrinter) -> bool:
        printer.setOutputFormat(QPrinter.OutputFormat.PdfFormat)
        printer.setOutputFileName("/nowhere/at/all.pdf")
        return True

    monkeypatch.setattr(handout_dialogs, "ask_printer", choose)
    QTest.mouseClick(handout.print, Qt.MouseButton.LeftButton)
    assert handout.notice.text() == "The printer did not take the page."


def test_leaving_the_printers_dialog_says_nothing(opened: Opened, monkeypatch: pytest.MonkeyPatch) -> None:
    """No printer chosen, nothing printed, nothing said."""
    _, handout = opened()
    monkeypatch.setattr(handout_dialogs, "ask_printer", lambda parent, printer: False)
    QTest.mouseClick(handout.print, Qt.MouseButton.LeftButton)
    assert handout.notice.text() == ""


@pytest.mark.parametrize("zoom", [1.0, 2.0])
@pytest.mark.parametrize("appearance", ["light", "dark"])
def test_ticks_are_large_and_seen(opened: Opened, zoom: float, appearance: str) -> None:
    """Targets of at least 24 pixels that grow with the text, drawn in the palette's colours."""
    window, handout = opened()
    window.look.set_appearance(appearance)
    window.look.set_zoom(zoom)
    tick = handout._ticks[0]
    assert tick.sizeHint().height() >= 24 * zoom
    image = tick.grab().toImage()
    shades = {image.pixelColor(x, y).name() for x in range(image.width() // 2) for y in range(image.height())}
    assert window.look.colour("accent").name() in shades
