#pragma once

#include <string>
#include <utility>
#include <vector>

#include <sys/types.h>

#include "folder.hpp"

// Runs the built program as a user would and takes down what it said.
namespace rainledger::cli_test {

using testing::Folder;

/// The words of both, in order.
inline std::vector<std::string> joined(std::vector<std::string> words,
                                       const std::vector<std::string>& more) {
    for (const std::string& word : more)
        words.push_back(word);
    return words;
}

/// Where standard output goes.
enum class Out {
    captured,
    full_disk,    ///< /dev/full
    closed_pipe,  ///< a pipe without a reader
    closed,       ///< no descriptor at all
};

struct Setting {
    std::string folder;  ///< the working directory
    Out out = Out::captured;
    bool errors_on_terminal = false;  ///< standard error is a pseudo-terminal
    std::vector<std::pair<std::string, std::string>> environment = {};
};

struct Outcome {
    int status = -1;  ///< exit status; 1000 + signal when killed by one
    std::string out;
    std::string err;
};

/// Runs the program with `words` after its name.
[[nodiscard]] Outcome run(const Setting& setting, const std::vector<std::string>& words);

/// Starts the program, waits until a file whose name holds `sign` appears in the working directory
/// (for at most ten seconds), sends `signal`, and waits for the end.
[[nodiscard]] Outcome run_and_signal(const Setting& setting, const std::vector<std::string>& words,
                                     const std::string& sign, int signal);

}  // namespace rainledger::cli_test
