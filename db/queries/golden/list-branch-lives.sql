select `branches`.`id` as `branchId`, `closed_on` as `closedOn`, (select `completed_on` from (select * from job_facts where branch_id in (select value from json_each(?)) and gen_from <= (select generation from network) and gen_to > (select generation from network)) as `job_facts` where job_facts.branch_id = branches.id order by `completed_on` asc limit ?) as `firstOn`
from `branches`
where branches.id in (select value from json_each(?));
