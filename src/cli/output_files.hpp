#pragma once

#include <cstddef>
#include <string>
#include <string_view>
#include <vector>

#include "rainledger/base/whole_file.hpp"

namespace rainledger {

/// Makes an interrupt (SIGINT, SIGTERM, SIGHUP) remove the temporary files of every OutputFiles and
/// end the program with status 130, and a closed pipe or an exhausted file size limit show up as a
/// failed write instead of killing the program.
void catch_signals();

/// The output files of one run: all opened, then all written, then all committed. Whatever was not
/// committed leaves nothing behind, after a signal neither. At most eight files.
class OutputFiles {
public:
    OutputFiles() = default;
    OutputFiles(const OutputFiles&) = delete;
    OutputFiles& operator=(const OutputFiles&) = delete;
    ~OutputFiles();

    /// Opens a file. False with `problem` ("PATH: no such file or directory") on failure.
    [[nodiscard]] bool open(const std::string& path, std::string& problem);
    /// Writes the first file, in the order of opening, that is not written yet. Two of them may be
    /// one device, so their names do not tell them apart.
    [[nodiscard]] bool write_next(std::string_view content, std::string& problem);
    /// Gives every file its name.
    [[nodiscard]] bool commit(std::string& problem);

private:
    std::vector<WholeFile> files_;
    std::size_t written_ = 0;
};

}  // namespace rainledger
