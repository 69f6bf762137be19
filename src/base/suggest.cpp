#include "rainledger/base/suggest.hpp"

#include <algorithm>
#include <cstddef>
#include <vector>

namespace rainledger {
namespace {

constexpr std::size_t kMostEdits = 3;
constexpr std::size_t kLongestName = 64;  // longer than any key; bounds the work on hostile input

std::string folded(std::string_view name) {
    std::string out(name);
    for (char& c : out) {
        if (c >= 'A' && c <= 'Z') c = static_cast<char>(c - 'A' + 'a');
        if (c == '-' || c == ' ') c = '_';
    }
    return out;
}

/// Optimal string alignment distance, by the usual three-row dynamic programme.
std::size_t edits(const std::string& a, const std::string& b) {
    std::vector<std::size_t> before(b.size() + 1);
    std::vector<std::size_t> last(b.size() + 1);
    std::vector<std::size_t> row(b.size() + 1);
    for (std::size_t j = 0; j <= b.size(); ++j)
        last[j] = j;
    for (std::size_t i = 1; i <= a.size(); ++i) {
        row[0] = i;
        for (std::size_t j = 1; j <= b.size(); ++j) {
            const std::size_t change = a[i - 1] == b[j - 1] ? 0 : 1;
            row[j] = std::min({last[j] + 1, row[j - 1] + 1, last[j - 1] + change});
            if (i > 1 && j > 1 && a[i - 1] == b[j - 2] && a[i - 2] == b[j - 1])
                row[j] = std::min(row[j], before[j - 2] + 1);
        }
        std::swap(before, last);
        std::swap(last, row);
    }
    return last[b.size()];
}

}  // namespace

std::optional<std::string_view> nearest(std::string_view typed,
                                        std::span<const std::string_view> known) {
    if (typed.empty() || typed.size() > kLongestName) return std::nullopt;
    const std::string from = folded(typed);
    std::optional<std::string_view> best;
    std::size_t fewest = kMostEdits + 1;
    for (const std::string_view name : known) {
        const std::size_t distance = edits(from, folded(name));
        if (distance < fewest && 2 * distance < std::max(from.size(), name.size())) {
            fewest = distance;
            best = name;
        }
    }
    return best;
}

std::string suggestion(std::string_view typed, std::span<const std::string_view> known) {
    if (const auto name = nearest(typed, known))
        return "did you mean '" + std::string(*name) + "'?";
    std::string out = "known here: ";
    for (std::size_t i = 0; i < known.size(); ++i) {
        if (i > 0) out += ", ";
        out += known[i];
    }
    return out;
}

}  // namespace rainledger
