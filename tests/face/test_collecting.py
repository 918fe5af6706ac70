"""Cycles of objects are collected by the window's thread alone: Qt's objects must not be destroyed in another one."""

from __future__ import annotations

import gc
import threading
from collections.abc import Callable

from pytestqt.qtbot import QtBot

from fourcount.face.window import MainWindow


class Knot:
    """An object that refers to itself, and notes in which thread it is destroyed."""

    def __init__(self, ends: list[int]) -> None:
        self._ends = ends
        self._itself = self

    def __del__(self) -> None:
        self._ends.append(threading.get_ident())


def test_a_worker_collects_nothing(open_window: Callable[[], MainWindow]) -> None:
    """However much a thread allocates, what it did not make stays until the window's thread looks."""
    open_window()
    ends: list[int] = []
    for _ in range(10):
        Knot(ends)
    worker = threading.Thread(target=lambda: [[[]] for _ in range(200_000)])
    worker.start()
    worker.join()
    assert not ends


def test_the_window_collects_in_its_own_time(open_window: Callable[[], MainWindow], qtbot: QtBot) -> None:
    """Young cycles go at the next look, without a call of anybody's."""
    window = open_window()
    window.collecting.setInterval(1)
    ends: list[int] = []
    for _ in range(10):
        Knot(ends)
    rubbish = [[[]] for _ in range(2 * gc.get_threshold()[0])]
    qtbot.waitUntil(lambda: len(ends) == 10)
    assert set(ends) == {threading.get_ident()}
    assert rubbish
