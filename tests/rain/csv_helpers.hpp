#pragma once

#include <string>
#include <utility>

#include "rainledger/rain/hyetograph_csv.hpp"
#include "test.hpp"

namespace rainledger {

/// Everything that reading `text` reports, as people see it. Checks that there is a hyetograph
/// exactly when nothing is an error.
inline std::string problems_in(std::string text, const CsvLayout& layout) {
    Diagnostics diagnostics;
    const auto rain = read_hyetograph_csv("gauge.csv", std::move(text), layout, diagnostics);
    CHECK(rain.has_value() != diagnostics.has_errors());
    std::string out;
    for (const Diagnostic& diagnostic : diagnostics.list())
        out += render(diagnostic);
    return out;
}

/// The hyetograph of a text in which nothing is to be reported.
inline Hyetograph read_clean(std::string text, const CsvLayout& layout = {}) {
    Diagnostics diagnostics;
    const auto rain = read_hyetograph_csv("gauge.csv", std::move(text), layout, diagnostics);
    for (const Diagnostic& diagnostic : diagnostics.list())
        UNSCOPED_INFO(render(diagnostic));
    REQUIRE(diagnostics.list().empty());
    REQUIRE(rain.has_value());
    return *rain;
}

}  // namespace rainledger
