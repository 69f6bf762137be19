#pragma once

namespace rainledger {

/// What the program tells its caller on ending.
enum class ExitStatus : int {
    done = 0,
    finding = 1,       ///< done, and a review found something that must be answered
    wrong_usage = 2,   ///< the command line is wrong
    wrong_input = 3,   ///< an input is wrong
    file_trouble = 4,  ///< a file could not be read or written
    fault = 5,         ///< a fault of the program itself
    interrupted = 130,
};

}  // namespace rainledger
