"""The methods once more, at 50 digits, written from the published formulas alone.

make_oracle.py uses them where no library answers, or where a library is not good enough. Nothing here imports
fourcount.
"""
