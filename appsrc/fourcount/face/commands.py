"""What each command and each choice does to the record: one small slot for each."""

from __future__ import annotations

import re
from collections.abc import Callable
from typing import TYPE_CHECKING, Any, cast

from PySide6.QtCore import QObject, Signal
from PySide6.QtGui import QGuiApplication
from PySide6.QtWidgets import QWidget

from fourcount.face import clipboard, dialogs
from fourcount.face.own_choices import OwnChoices
from fourcount.face.session import Document, Session
from fourcount.ink.style import Style
from fourcount.record import editing
from fourcount.record.outcome import CELLS, Design, Form, Layout, Outcome, PaperMeasure, form_of
from fourcount.record.paper import Choices, Family, Record
from fourcount.wording import labels, numbers

if TYPE_CHECKING:
    from fourcount.appraisal.findings import CheckFindings
    from fourcount.face.patient.figures import Figures
    from fourcount.record.entry.readings import Pasted


CHOOSING: dict[str, Callable[..., Any]] = {
    "counting": editing.with_counting,
    "follow_up_varied": editing.with_follow_up_varied,
    "where": editing.with_where,
    "adjusted_measure": editing.with_adjusted_measure,
    "paper_measure": editing.with_paper_measure,
    "of_total": editing.with_of_total,
    "effect": editing.with_effect,
    "start_kind": editing.with_start_kind,
    "certainty": editing.with_certainty,
    "on_handout": editing.with_on_handout,
    "line_kind": editing.with_line_kind,
    "line_scale": editing.with_line_scale,
    "line_side": editing.with_line_side,
}
"""What takes the choices of rows that are not always there, and those of the patient's column."""


USUAL_MEASURES = ("risk_ratio", "odds_ratio", "rate_ratio")
"""What papers mostly print; another choice was somebody's own."""

NUMBERS = re.compile(r"\d+")


class Commands(QObject):
    """The slots of the menus' record commands and of the choices in the columns.

    **Signals**
        cell_wanted: the table begins anew; bring the cursor to its first cell.
        noticed: a short notice of what was just copied. Carries its sentence.
        told: a short notice of what became of the table. Carries its sentence.
        paste_offered: a paste might be understood otherwise; show it before it is taken. Carries the ``Pasted``.
        pasted: a paste filled the table.
    """

    cell_wanted = Signal()
    noticed = Signal(str)
    told = Signal(str)
    paste_offered = Signal(object)
    pasted = Signal()

    def __init__(self, session: Session, style: Style, window: QWidget) -> None:
        super().__init__(window)
        self._session = session
        self._style = style
        self._window = window
        self.figures: Figures | None = None
        self.own = OwnChoices(session)
        self._origin = session.outcome
        self._stepped: tuple[str, Outcome] | None = None

    def new_table(self) -> None:
        """Begin with an empty record and the intervals last chosen by hand; undo brings the last one back."""
        record = Record(choices=self.own.choices)
        self._session.change_record(record, document=Document(record))
        self.cell_wanted.emit()
        self.tell_unusual_choices()

    def open_example(self) -> None:
        """Show the worked example with its own choice of intervals; undo brings the last record back."""
        from fourcount.wording.example import worked_example

        self.own.bring(worked_example().choices)
        record = worked_example()
        self._session.change_record(record, document=Document(record))
        self.cell_wanted.emit()

    def swap_groups(self) -> None:
        """Make the other group the index group; a typed starting risk stays, and now stands for the other group."""
        self._session.change_outcome(editing.swap_groups(self._session.outcome))
        if self._session.outcome.patient.starting_risk_text.strip():
            self.told.emit(labels.RISK_OF_OTHER_GROUP)

    def count_other_outcome(self) -> None:
        """Count the other column."""
        self._session.change_outcome(editing.count_other_outcome(self._session.outcome))

    def clear_counts(self) -> None:
        """Empty the four cells."""
        self._session.change_outcome(editing.clear_table(self._session.outcome))
        self.cell_wanted.emit()

    def change_layout(self) -> None:
        """Run the groups the other way."""
        self.choose_layout("across" if self._session.outcome.layout == "down" else "down")

    def choose_design(self, key: Design) -> None:
        """Take a study design."""
        self._step("design", lambda origin: editing.with_design(origin, key))

    def choose_welcome(self, key: str) -> None:
        """Say whether the counted outcome is a good one."""
        self._session.change_outcome(editing.with_welcome(self._session.outcome, key == "welcome"))

    def choose_form(self, key: Form) -> None:
        """Take a form of print by its key. Empty strata begin as 38 of 412, as most papers print them."""
        self._step("form", lambda origin: _in_form(origin, key))

    def _step(self, kind: str, change: Callable[[Outcome], Outcome]) -> None:
        """Choose anew from where a run of such choices began: a form that is only passed through loses nothing."""
        now = self._session.outcome
        if self._stepped != (kind, now):
            self._origin = now
        outcome = _fitting_measure(change(self._origin))
        self._stepped = (kind, outcome)
        self._session.change_outcome(outcome)
        if kind == "form" and outcome.design != now.design:
            self.told.emit(labels.STUDY_FOLLOWED.format(study=labels.DESIGNS[outcome.design]))
        if kind == "design" and form_of(outcome.table) != form_of(now.table):
            form = form_of(outcome.table)
            self.told.emit(labels.FORM_FOLLOWED.format(specimen=labels.FORMS[form], note=labels.FORM_NOTES[form]))

    def choose(self, field: str, choice: object) -> None:
        """Take what was chosen in one of the column's rarer choices."""
        self._session.change_outcome(CHOOSING[field](self._session.outcome, choice))

    def add_row(self) -> None:
        """One more row of strata."""
        self._session.change_outcome(editing.add_stratum(self._session.outcome))

    def remove_row(self, place: int) -> None:
        """Take a row of strata out."""
        self._session.change_outcome(editing.remove_stratum(self._session.outcome, place))

    def adopt(self, found: CheckFindings | None) -> None:
        """Take the family and the level under which the figures are the paper's, as one step."""
        if found and found.adopt:
            family, level = found.adopt
            record = editing.with_level(self._session.record, level)
            record = editing.with_family(record, cast("Family", family))
            self.own.bring(record.choices)
            self._session.change_record(record)

    def choose_layout(self, key: Layout) -> None:
        """Run the groups down or across."""
        self._session.change_outcome(editing.with_layout(self._session.outcome, key))

    def choose_family(self, key: Family) -> None:
        """Take a family of intervals."""
        self._take_own(editing.with_family(self._session.record, key))

    def choose_level(self, level: float) -> None:
        """Take a confidence level, a fraction."""
        self._take_own(editing.with_level(self._session.record, level))

    def _take_own(self, record: Record) -> None:
        self.own.choose(record.choices)
        self._session.change_record(record)

    def copy_text(self) -> None:
        """Copy the findings as text."""
        self._session.settle()
        self._tell("copy-text", clipboard.copy_text(self._session))

    def copy_table(self) -> None:
        """Copy the findings as a table."""
        self._session.settle()
        self._tell("copy-table", clipboard.copy_table(self._session))

    def copy_picture(self) -> None:
        """Copy the picture of the patient as people, or as bars where it is drawn so."""
        self._session.settle()
        picture = self.figures.drawn if self.figures else None
        self._tell("copy-picture", clipboard.copy_picture(self._session, picture, self._style))

    def take_table(self, field: str, text: str) -> bool:
        """Fill the table from a text that was pasted into a field; False where the text belongs into the field."""
        if len(text.split()) < 2 and "," not in text:
            return False  # one word or one number
        from fourcount.record.editing.pasted_row import pasted_row
        from fourcount.record.entry.paste import read_paste
        from fourcount.wording.printed_labels import ROW_PASTED

        outcome, into_cell = self._session.outcome, field.rsplit(".", maxsplit=1)[-1] in CELLS
        row = pasted_row(outcome, field, text)
        if row is not None:
            self._session.change_outcome(row)
            self.told.emit(ROW_PASTED.format(number=int(field.split(".")[1]) + 1))
            return True
        pasted = read_paste(text)
        if pasted is None or (pasted.form == "effect-only" and not into_cell):
            return False  # an effect alone is text among words, and where printed effects stand
        self._offer_or_take(pasted)
        return True

    def paste(self) -> None:
        """Fill the table from the clipboard, wherever the cursor is."""
        from fourcount.record.entry.paste import read_paste
        from fourcount.wording.printed_labels import COUNTS_NOT_UNDERSTOOD, NO_TABLE_PASTED

        text = QGuiApplication.clipboard().text()
        pasted = read_paste(text)
        if pasted is None:
            self.told.emit(COUNTS_NOT_UNDERSTOOD if len(NUMBERS.findall(text)) > 1 else NO_TABLE_PASTED)
        else:
            self._offer_or_take(pasted)

    def take_paste(self, pasted: Pasted) -> None:
        """Fill the table with what was understood, and say what was filled."""
        from fourcount.wording.pasted import filled

        before = self._session.outcome
        another = editing.brings_another_table(before, pasted)
        self._session.change_outcome(editing.take_paste(before, pasted))
        self.pasted.emit()
        self.told.emit(filled(before, self._session.outcome, another=another))

    def _offer_or_take(self, pasted: Pasted) -> None:
        from fourcount.record.entry.turning import in_chosen_form

        pasted = in_chosen_form(pasted, form_of(self._session.outcome.table))
        if pasted.ambiguous:
            self.paste_offered.emit(pasted)
        else:
            self.take_paste(pasted)

    def tell_unusual_choices(self) -> None:
        """Say so where a new table begins with other intervals than those of a first start."""
        choices = self._session.record.choices
        if choices != Choices():
            level = numbers.level(choices.level)
            self.told.emit(labels.CHOICES_AS_LAST.format(family=labels.FAMILIES[choices.family], level=level))

    def _tell(self, key: str, done: bool) -> None:
        self.noticed.emit(labels.COPIED[key] if done else labels.NOTHING_TO_COPY)

    def ask_level(self) -> None:
        """Ask for any other level until it can be read or the question is put away."""
        from fourcount.record.entry.level import read_level
        from fourcount.record.entry.readings import Proportion, Unreadable
        from fourcount.wording.gaps import mark_text

        now, problem = numbers.level(self._session.record.choices.level), ""
        while (text := dialogs.ask_level(self._window, now, problem)) is not None:
            reading = read_level(text)
            if isinstance(reading, Proportion):
                self.choose_level(reading.value)
                break
            now, problem = text, mark_text(reading) if isinstance(reading, Unreadable) else ""


def _in_form(outcome: Outcome, key: Form) -> Outcome:
    formed = editing.in_form(outcome, key)
    if key == "strata" and not editing.typed_texts(outcome):
        return editing.with_of_total(formed, True)
    return formed


def _fitting_measure(outcome: Outcome) -> Outcome:
    """While the paper says nothing yet, the measure that papers print of such a table."""
    if outcome.paper_text.strip() or outcome.paper_measure not in USUAL_MEASURES:
        return outcome
    form = form_of(outcome.table)
    odds, rates = outcome.design in ("case-control", "matched") or form == "effect-only", form == "person-time"
    measure: PaperMeasure = "rate_ratio" if rates else "odds_ratio" if odds else "risk_ratio"
    return editing.with_paper_measure(outcome, measure)
