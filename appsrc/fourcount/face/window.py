"""The window: three columns over a strip of cautions, wired to one session."""

from __future__ import annotations

from itertools import pairwise
from typing import TYPE_CHECKING

from PySide6.QtCore import QSize, Qt, QTimer, Signal
from PySide6.QtGui import QAction, QActionGroup, QCloseEvent, QIcon, QKeyEvent, QPaintEvent, QResizeEvent
from PySide6.QtWidgets import QApplication, QVBoxLayout, QWidget

from fourcount.face import actions as commands_table
from fourcount.face.as_printed import AsPrinted
from fourcount.face.cautions_strip import CautionsStrip
from fourcount.face.columns import Page, PageScroll
from fourcount.face.file_target import FileTarget
from fourcount.face.for_one_patient import ForOnePatient
from fourcount.face.header import Banner, Hairline, Header
from fourcount.face.later import Later
from fourcount.face.look import Look
from fourcount.face.session import Session
from fourcount.face.settings import Settings
from fourcount.face.what_it_says import WhatItSays
from fourcount.record.outcome import Outcome, Strata
from fourcount.record.paper import Choices, Record
from fourcount.wording import labels
from fourcount.wording.standing import STANDING

if TYPE_CHECKING:
    from fourcount.appraisal.findings import OutcomeFindings
    from fourcount.face.checking import Checking
    from fourcount.face.collecting import Collecting
    from fourcount.face.commands import Commands
    from fourcount.face.cursor_keeper import CursorKeeper
    from fourcount.face.file_commands import FileCommands
    from fourcount.face.outcome_commands import OutcomeCommands
    from fourcount.face.reading import Reading
    from fourcount.face.view_commands import ViewCommands

FIRST_SIZE = QSize(1280, 800)
ROOM_FOR_A_FRAME = QSize(0, 40)
SMALLEST_SIZE = QSize(480, 360)


class MainWindow(FileTarget):
    """Everything on screen; the record itself lives in the session.

    **Signals**
        first_painted: the first paint is over.
        numbers_ready: the numerical libraries are loaded, so that no figure has to wait for them.
    """

    first_painted = Signal()
    numbers_ready = Signal()
    collecting: Collecting
    commands: Commands
    cursor_keeper: CursorKeeper
    outcomes: OutcomeCommands
    reading: Reading
    view: ViewCommands
    drawing: tuple[QActionGroup, QActionGroup]
    files: FileCommands
    keeps_aside: QAction
    checking: Checking | None = None

    def __init__(self, session: Session, look: Look, settings: Settings, later: Later) -> None:
        super().__init__()
        self.session = session
        self.look = look
        self._settings = settings
        self._later = later
        self._painted = False
        self._shown: tuple[Record, int] | None = None
        self.actions_by_key = commands_table.make_actions(self)
        self.header = Header(look)
        self.banner = Banner(look)
        self.printed = AsPrinted(look, self.actions_by_key)
        self.says = WhatItSays(look, self.actions_by_key)
        self.patient = ForOnePatient(look)
        self.cautions = CautionsStrip(look, STANDING)
        self._build()
        self._connect_all()
        self._show_state(session.record, None)
        self._set_tab_order()
        self.printed.first_field.setFocus()

    def _build(self) -> None:
        self.setWindowTitle(labels.WINDOW_TITLE)
        self.setMinimumSize(SMALLEST_SIZE)
        self.resize(FIRST_SIZE.boundedTo(self.screen().availableSize() - ROOM_FOR_A_FRAME))
        self.menus = commands_table.fill_menus(self, self.actions_by_key)
        self._appearances = commands_table.add_appearances(self, self.menus["view"], self.look.appearance)
        inside = QWidget()
        column = QVBoxLayout(inside)
        column.setContentsMargins(0, 0, 0, 0)
        column.setSpacing(0)
        column.addWidget(self.header)
        column.addWidget(self.banner)
        self.page = Page(self.look, (self.printed, self.says, self.patient))
        self.page_scroll = PageScroll(self.look, self.page)
        column.addWidget(self.page_scroll, 1)
        column.addWidget(Hairline(self.look))
        column.addWidget(self.cautions)
        self.setCentralWidget(inside)
        self._on_look_changed()
        geometry = self._settings.geometry()
        if not geometry.isEmpty():
            self.restoreGeometry(geometry)

    def _set_tab_order(self) -> None:
        """Cells in reading order right after the words above them."""
        grid, printed, says, patient = self.printed.grid, self.printed, self.says, self.patient
        order: list[QWidget] = [
            self.header.title, self.header.source, printed.design, printed.name, printed.welcome,
            printed.event_words, printed.span,
            printed.form, printed.layout_choice, grid.headings["left"], grid.headings["right"], grid.labels["first"],
            grid.labels["second"], *grid.cells.values(), *printed.links, printed.example, says.sentence,
            says.family, says.level, says.more, says.help, *says.copies, patient.baseline,
            patient.source, patient.effect, self.cautions,
        ]  # fmt: skip
        for before, after in pairwise(order):
            self.setTabOrder(before, after)

    def _connect_all(self) -> None:
        """All wiring of the window, in one place."""
        self.patient.marked.connect(self.page_scroll.bring)
        for view in (self.header, self.printed, self.says, self.patient):
            view.edited.connect(self.session.edit_text)
            view.edited.connect(self._show_focus)
            view.left.connect(self.session.end_run)
        self.session.changed.connect(self._show_state)
        self._later.arrived.connect(self._on_figures_arrived)
        self._later.loaded.connect(self._on_libraries_loaded)
        self.look.changed.connect(self._on_look_changed)
        self.look.changed.connect(self._fit_strip)
        application = QApplication.instance()
        if isinstance(application, QApplication):
            application.focusChanged.connect(self._show_focus)
        self.first_painted.connect(self._on_first_painted)

    def _connect_commands(self, do: Commands, go: CursorKeeper, among: OutcomeCommands, see: ViewCommands) -> None:
        """The wiring of all that a hand can do but type: nobody can before the first paint."""
        self.printed.design.chosen.connect(do.choose_design)
        self.printed.welcome.chosen.connect(do.choose_welcome)
        self.printed.form.chosen.connect(do.choose_form)
        self.printed.take_table = do.take_table
        self.printed.chosen.connect(do.choose)
        self.printed.row_wanted.connect(go.add_row_by_enter)
        self.printed.paste_taken.connect(do.take_paste)
        self.printed.paste_left.connect(go.paste_over)
        do.paste_offered.connect(go.paste_offered)
        do.pasted.connect(go.paste_over)
        self.printed.layout_choice.chosen.connect(do.choose_layout)
        self.printed.example_wanted.connect(self.files.example)
        self.says.family_chosen.connect(do.choose_family)
        self.says.level_chosen.connect(do.choose_level)
        self.says.chosen.connect(do.choose)
        self.patient.chosen.connect(do.choose)
        do.cell_wanted.connect(go.to_first_cell)
        if self.checking:
            self.checking.changed.connect(self._show_check)
        if self.header.bar:
            self.header.bar.tabs.looked_at.connect(among.look_at)
            self.header.bar.tabs.moved.connect(among.move_to)
        self.drawing[0].triggered.connect(see.take_icons)
        self.drawing[1].triggered.connect(see.take_arrangement)
        among.begun.connect(go.to_first_cell)
        among.told.connect(self._on_told)
        self.dropped.connect(self.files.take_dropped)
        self.came_forward.connect(self.files.keeping.look)
        self.keeps_aside.triggered.connect(self.files.switch_set_aside)
        self.session.changed.connect(self.files.follow)
        self.files.noticed.connect(do.noticed)
        self.files.failed.connect(self.banner.tell)
        do.noticed.connect(self.header.tell)
        do.noticed.connect(self.banner.hide)
        do.told.connect(self._on_told)
        self.session.focus_wanted.connect(go.focus_wanted)
        handlers = {
            "new": self.files.new, "example": self.files.example, "quit": self.close, "undo": self.session.undo,
            "redo": self.session.redo, "copy-text": do.copy_text, "copy-table": do.copy_table,
            "copy-picture": do.copy_picture, "swap": do.swap_groups, "count-other": do.count_other_outcome,
            "paste": do.paste, "study": go.to_study, "form": go.to_form, "add-row": go.add_row,
            "remove-row": go.remove_row, "adopt": self._on_adopt, "paper": go.to_paper, "level": do.ask_level,
            "layout": do.change_layout, "clear": do.clear_counts, "own-line": go.to_own_line,
            "first-cell": go.to_first_cell, "baseline": go.to_baseline, "bigger": see.bigger,
            "smaller": see.smaller, "actual": see.actual, "bars": see.bars, "more": see.more,
            "uncertainty": see.uncertainty, "relative": see.relative, "show-patient": see.show_patient,
            "handout": see.handout, "curve": see.curve, "methods": see.methods, "keys": see.keys, "about": see.about,
            "outcome-add": among.add, "outcome-copy": among.copy, "outcome-next": among.next,
            "outcome-previous": among.previous, "outcome-left": among.move_left,
            "outcome-right": among.move_right, "outcome-remove": among.remove, "open": self.files.open,
            "save": self.files.save, "save-as": self.files.save_as, "kept": self.files.kept,
        }  # fmt: skip
        for key, handler in handlers.items():
            self.actions_by_key[key].triggered.connect(handler)
        self.menus["forms"].triggered.connect(go.form_chosen)
        self._appearances.triggered.connect(see.take_appearance)

    @property
    def later(self) -> Later:
        """The worker, for a window beside this one."""
        return self._later

    # What is shown

    def _show_state(self, record: Record, findings: OutcomeFindings | None) -> None:
        """Show a record and its findings in every view; ask for what follows later."""
        outcome = self.session.outcome
        self.header.show_state(record)
        self.printed.show_state(outcome, findings)
        if self.checking:
            self.checking.follow()
        self._show_check()
        self.says.show_state(record, outcome, findings)
        self.patient.show_state(record, outcome, findings)
        self.cautions.show_state(findings)
        self.actions_by_key["undo"].setEnabled(self.session.can_undo)
        self.actions_by_key["redo"].setEnabled(self.session.can_redo)
        for key in ("add-row", "remove-row"):
            self.actions_by_key[key].setEnabled(isinstance(outcome.table, Strata))
        self.actions_by_key["baseline"].setEnabled(self.patient.takes_a_risk)
        if self.header.bar:
            self.header.bar.show_state(record, self.session.view)
            self.outcomes.show_enabled(self.actions_by_key)
            self.actions_by_key["curve"].setEnabled(self.patient.has_curve)
        path = self.session.document.path
        self.setWindowTitle(labels.window_title(record.title_text, path.name if path else ""))
        self.setWindowFilePath(str(path or ""))
        self.setWindowModified(self.session.unsaved)
        if self._shown is None or record is not self._shown[0] or self.session.view != self._shown[1]:
            self._shown = (record, self.session.view)
            self._end_notices()
        self._ask_for_the_rest()

    def _end_notices(self) -> None:
        """What was told of the last state says nothing of a new one."""
        self.header.tell("")
        self.printed.tell("")
        self.banner.hide()

    def _show_check(self) -> None:
        """Show what the paper says, and what the last check found."""
        found = self.checking.found if self.checking else None
        choices = self.session.record.choices
        answer = self.printed.show_check(self.session.outcome, found, choices)
        if answer:
            self.page_scroll.bring(*answer)
        new = bool(found and found.adopt and found.adopt != (choices.family, choices.level))
        self.actions_by_key["adopt"].setEnabled(new)

    def _ask_for_the_rest(self) -> None:
        if self.session.findings is not None:
            from fourcount.appraisal.waiting import waits

            if waits(self.session.findings):
                self._later.ask(self.session.outcome, self.session.record.choices)

    def tell_unexpected(self, name: str, place: str) -> None:
        """Say in one sentence that something unexpected happened."""
        pattern = labels.UNEXPECTED if place else labels.UNEXPECTED_NO_LOG
        self.banner.tell(pattern.format(name=name, place=place))

    # Qt's own

    def paintEvent(self, event: QPaintEvent) -> None:
        super().paintEvent(event)
        if not self._painted:
            self._painted = True
            QTimer.singleShot(0, self.first_painted.emit)

    def keyPressEvent(self, event: QKeyEvent) -> None:
        if event.key() == Qt.Key.Key_Escape and (self.printed.rare.leave_paste() or self.says.close_working()):
            return
        super().keyPressEvent(event)

    def resizeEvent(self, event: QResizeEvent) -> None:
        super().resizeEvent(event)
        self._fit_strip()

    def _fit_strip(self) -> None:
        self.cautions.fit()
        self.patient.show_standing(self.cautions.narrow)

    def closeEvent(self, event: QCloseEvent) -> None:
        if self.checking and not self.files.may_leave():
            event.ignore()
            return
        own = self.commands.own.choices if self.checking else self.session.record.choices
        self._settings.keep(geometry=self.saveGeometry(), zoom=self.look.zoom, appearance=self.look.appearance)
        if self.checking:
            self._settings.keep(**self.view.kept)
            self.files.leave()
        self._settings.keep(family=own.family, level=own.level)
        self._later.close()
        super().closeEvent(event)

    # Slots

    def _on_first_painted(self) -> None:
        from fourcount.assets_folder import assets_folder
        from fourcount.face.waking import wake

        self.setWindowIcon(QIcon(str(assets_folder() / "fourcount.png")))
        wake(self, self._settings, self._later)
        self._connect_commands(self.commands, self.cursor_keeper, self.outcomes, self.view)
        self.collecting.take_over()
        self.session.wake()
        self.commands.tell_unusual_choices()
        self._later.load()
        self.files.begin(self.wanted_file)

    def take_file(self, path: str) -> None:
        """Open a file that the system hands over, once the window stands."""
        if self.checking:
            self.files.open_beside(path)
        else:
            self.wanted_file = path

    def _on_libraries_loaded(self) -> None:
        self.session.announce()
        self.numbers_ready.emit()

    def _on_figures_arrived(self, outcome: Outcome, choices: Choices, findings: OutcomeFindings) -> None:
        if choices == self.session.record.choices:
            self.session.take_findings(outcome, findings)

    def _on_adopt(self) -> None:
        self.commands.adopt(self.checking.settle() if self.checking else None)

    def _on_told(self, notice: str) -> None:
        self.printed.tell(notice)
        if self.printed.notice:
            self.page_scroll.bring(self.printed.notice, self.printed.notice)

    def _on_look_changed(self) -> None:
        application = QApplication.instance()
        if isinstance(application, QApplication):
            application.setPalette(self.look.qt_palette())
        self.menuBar().setFont(self.look.font("body"))
        for menu in self.menus.values():
            menu.setFont(self.look.font("body"))
        self.update()
        QTimer.singleShot(0, self._show_focus)

    def _show_focus(self, *_: object) -> None:
        """Bring what has the focus into view."""
        focus = self.focusWidget() if self._painted else None  # the first paint shows the top
        if focus and self.page.isAncestorOf(focus):
            self.page_scroll.show_whole(focus)
