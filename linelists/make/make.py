"""Makes the line lists from a folder of atomic tables: python3 linelists/make/make.py ATOMIC_FOLDER"""
import os
import sys

import balmer
import early
import listfile
import metals
import nebular


def main():
    if len(sys.argv) != 2:
        sys.exit("usage: python3 linelists/make/make.py ATOMIC_FOLDER, the folder that holds nist-lines.csv and its companions")
    target = os.path.dirname(os.path.dirname(os.path.abspath(__file__)))
    for name, module in (("balmer", balmer), ("metals-fgk", metals), ("early-type", early), ("nebular", nebular)):
        listfile.write(target, name, module.lines(sys.argv[1]), module.METADATA)


if __name__ == "__main__":
    main()
