#include "rain/csv_opening.hpp"

#include <algorithm>
#include <cstddef>
#include <utility>

namespace rainledger {
namespace {

constexpr std::string_view kByteOrderMark = "\xEF\xBB\xBF";

bool is_utf16(std::string_view text) {
    return text.starts_with("\xFF\xFE") || text.starts_with("\xFE\xFF");
}

}  // namespace

std::optional<std::string> without_mark(const std::string& name, std::string text,
                                        Diagnostics& diagnostics) {
    if (is_utf16(text)) {
        diagnostics.error(SourceText(name, {}).at(1, 1), "the file is UTF-16 text",
                          "save it as UTF-8");
        return std::nullopt;
    }
    if (text.starts_with(kByteOrderMark)) text.erase(0, kByteOrderMark.size());
    return text;
}

bool holds_nul(std::string_view text, CsvProblems& problems) {
    const std::size_t nul = text.find('\0');
    if (nul == std::string_view::npos) return false;
    const std::string_view before = text.substr(0, nul);
    const auto lines = static_cast<std::size_t>(std::count(before.begin(), before.end(), '\n'));
    const std::size_t newline = before.rfind('\n');
    problems.error(lines + 1, newline == std::string_view::npos ? nul + 1 : nul - newline,
                   "there is a NUL byte here",
                   "the file is damaged, or not plain text; save it anew as UTF-8");
    return true;
}

std::optional<Zone> find_zone(const CsvLayout& layout, CsvProblems& problems) {
    if (!layout.zone) return std::nullopt;
    auto zone = Zone::find(*layout.zone);
    if (!zone)
        problems.file_error("time zone " + shown(*layout.zone) + " is not known here",
                            "write a name of the time zone database, such as Europe/Madrid");
    return zone;
}

}  // namespace rainledger
