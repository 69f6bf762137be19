#include "rainledger/reference/antecedent.hpp"
