#pragma once

#include <string>
#include <string_view>

#include "rainledger/base/diagnostic.hpp"

// The two streams to the user: results on standard output, everything else on standard error.
namespace rainledger {

/// Makes the three standard descriptors usable even if the caller closed them, so that no output
/// file takes their number.
void keep_standard_descriptors();

/// Writes to standard output, a reader that has gone away being no failure. False with `problem` if
/// the text could not be written (disk full, say).
[[nodiscard]] bool write_results(std::string_view text, std::string& problem);

/// Standard error, with what the user asked of it.
class Messages {
public:
    /// Quiet messages leave out warnings and notes, never errors. Colour is used only on a
    /// terminal, and not with NO_COLOR or TERM=dumb.
    explicit Messages(bool quiet);

    void error(std::string_view text) const;  ///< "rainledger: TEXT"
    void note(std::string_view text) const;   ///< "rainledger: note: TEXT"

    /// Every warning and the first fifty errors.
    void show(const Diagnostics& diagnostics) const;

private:
    void print(std::string_view text) const;

    bool quiet_;
    bool colour_;
};

/// The two lines after a wrong command line: what is wrong, and where the help is.
void print_wrong_usage(std::string_view command, std::string_view problem);

}  // namespace rainledger
