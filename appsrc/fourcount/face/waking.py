"""What the window makes once it has painted: all that acts on the record, moves the cursor, or had nothing to show."""

from __future__ import annotations

from typing import TYPE_CHECKING

from PySide6.QtGui import QAction
from PySide6.QtWidgets import QMenu, QWidget

from fourcount.face import actions as commands_table
from fourcount.face.checking import Checking
from fourcount.face.collecting import Collecting
from fourcount.face.commands import Commands
from fourcount.face.cursor_keeper import CursorKeeper
from fourcount.face.file_commands import FileCommands
from fourcount.face.outcome_commands import OutcomeCommands
from fourcount.face.outcomes_bar import OutcomesBar
from fourcount.face.reading import Reading
from fourcount.face.view_commands import ViewCommands
from fourcount.picture.options import PictureOptions
from fourcount.wording.keeping import KEEP_ASIDE

if TYPE_CHECKING:
    from fourcount.face.later import Later
    from fourcount.face.settings import Settings
    from fourcount.face.window import MainWindow


def wake(window: MainWindow, settings: Settings, later: Later) -> None:
    """Make the parts of a window that no first paint needs; the window itself wires them."""
    actions, menus, session = window.actions_by_key, window.menus, window.session
    window.collecting = Collecting(window)
    window.page_scroll.take_slim_bar()
    actions |= commands_table.add_forms(window, menus["forms"])
    actions |= commands_table.add_later(window, menus, actions)
    window.commands = Commands(session, window.look, window)
    window.cursor_keeper = CursorKeeper(window)
    window.outcomes = OutcomeCommands(session, window)
    window.checking = Checking(session, later, window)
    options = PictureOptions(*settings.drawing())
    window.drawing = commands_table.add_drawing(menus["picture"], options.icons, options.arrangement)
    window.says.take_link(actions["own-line"])
    window.patient.wake(actions, menus["picture"], options)
    window.commands.figures = window.patient.figures
    window.view = ViewCommands(window)
    window.files = FileCommands(window, settings)
    window.keeps_aside = _set_aside_switch(menus["file"], actions["handout"], settings.sets_aside())
    window.setAcceptDrops(True)
    bar = OutcomesBar(window.look, actions["outcome-add"], menus["outcomes"])
    window.header.take_bar(bar)
    QWidget.setTabOrder(bar.plus, window.banner.dismiss)
    window.reading = Reading(window)


def _set_aside_switch(menu: QMenu, before: QAction, on: bool) -> QAction:
    """The switch under the commands that save."""
    action = QAction(KEEP_ASIDE, menu)
    action.setCheckable(True)
    action.setChecked(on)
    menu.insertAction(before, action)
    menu.insertSeparator(before)
    return action
