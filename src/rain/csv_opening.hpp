#pragma once

#include <optional>
#include <string>
#include <string_view>

#include "rain/csv_text.hpp"
#include "rainledger/base/diagnostic.hpp"
#include "rainledger/rain/hyetograph_csv.hpp"
#include "rainledger/rain/timestamp.hpp"

// What comes before the first row of a rain file.
namespace rainledger {

/// The text without a byte-order mark; UTF-16 is reported, and nothing returned.
[[nodiscard]] std::optional<std::string> without_mark(const std::string& name, std::string text,
                                                      Diagnostics& diagnostics);

/// Reports a NUL byte; true if there is one.
[[nodiscard]] bool holds_nul(std::string_view text, CsvProblems& problems);

/// The layout's time zone, if it names one; a name that is not known is reported.
[[nodiscard]] std::optional<Zone> find_zone(const CsvLayout& layout, CsvProblems& problems);

/// Problems that nobody is to hear of: of a first look at a file that will be read in earnest.
class SilentProblems {
public:
    SilentProblems() : problems_(source_, diagnostics_) {}
    SilentProblems(const SilentProblems&) = delete;
    SilentProblems& operator=(const SilentProblems&) = delete;

    [[nodiscard]] CsvProblems& problems() { return problems_; }

private:
    SourceText source_;
    Diagnostics diagnostics_;
    CsvProblems problems_;
};

}  // namespace rainledger
