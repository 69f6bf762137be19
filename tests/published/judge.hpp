#pragma once

#include <functional>
#include <string>
#include <vector>

#include "published/check_file.hpp"
#include "published/storm_books.hpp"

namespace rainledger::published {

/// Where the books of a storm come from.
using BookKeeper = std::function<StormBooks(const StoredStorm&)>;

/// Our values for a check, in the unit of its printed ones, and everything that is wrong with it,
/// one line each; empty when the check holds and its mark is true.
struct Verdict {
    std::vector<double> ours;
    std::string problems;
};

[[nodiscard]] Verdict judge(const CheckFile& file, const Check& check, const BookKeeper& keeper);

}  // namespace rainledger::published
